import type { NewVersionInput } from '#shared/schemas/comparison'

/** Saves a new version of a comparison: a job on the server, followed until it ends. `onSaved` is called when it stands. */
export function useSaveVersion(address: string, onSaved: () => Promise<unknown>) {
  const failed = ref('')
  const { job, open, follow } = useJob((job) => {
    if (job.status === 'done') void onSaved()
    else failed.value = job.message || 'The version could not be made.'
  })
  const asking = useSubmit(async (input: Partial<NewVersionInput>) => {
    failed.value = ''
    const { jobId } = await $fetch<{ jobId: string }>(`${address}/versions`, { method: 'POST', body: input })
    follow(jobId)
  })
  return {
    /** How far it is, while it is being saved. */
    progress: computed(() => open.value ? job.value : null),
    saving: computed(() => asking.busy.value || open.value),
    problem: computed(() => failed.value || asking.problem.value?.message || ''),
    save: asking.submit,
  }
}
