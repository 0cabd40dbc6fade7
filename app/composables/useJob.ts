import type { JobStatus } from '#shared/types/job'

export interface JobState { id: string, kind: string, status: JobStatus, progress: number, message: string, resultId: string | null }

/** Follows a job by polling until it ends; `onEnd` is called once, with its last state. */
export function useJob(onEnd: (job: JobState) => void = () => {}) {
  const job = ref<JobState | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined

  async function look(id: string) {
    try {
      job.value = await $fetch<JobState>(`/api/jobs/${id}`)
    }
    catch {
      // A lost connection is not the job's end: keep asking.
    }
    if (job.value?.id === id && !isOpen(job.value)) return onEnd(job.value)
    timer = setTimeout(() => look(id), 400)
  }
  function follow(id: string) {
    clearTimeout(timer)
    void look(id)
  }
  async function cancel() {
    if (job.value) await $fetch(`/api/jobs/${job.value.id}`, { method: 'DELETE' })
  }
  onScopeDispose(() => clearTimeout(timer))
  return { job, open: computed(() => job.value !== null && isOpen(job.value)), follow, cancel }
}

const isOpen = (job: JobState) => job.status === 'queued' || job.status === 'running'
