import type { UploadLine } from '#shared/types/table'

/** What a study has of one kind of file: what stands, what is under way, and the samples to choose from. */
export interface StudyFiles { uploads: UploadLine[], samples: { id: string, name: string }[] }

/** A study's files of one kind, asked for again while something is being read. `standing` counts what has been read: a change is told. */
export async function useStudyFiles<T extends StudyFiles>(address: string, standing: (files: T) => number, onRead: () => void) {
  const { data, error, refresh } = await useFetch<T>(address, { key: address })
  const files = computed(() => data.value as T | undefined)
  const uploads = computed(() => files.value?.uploads ?? [])
  const samples = computed(() => files.value?.samples ?? [])
  const withStatus = (status: UploadLine['status']) => computed(() => uploads.value.filter(line => line.status === status))
  const reading = withStatus('reading')
  const count = () => files.value ? standing(files.value) : 0
  let timer: ReturnType<typeof setTimeout> | undefined

  async function look() {
    clearTimeout(timer)
    const before = count()
    await refresh()
    if (count() !== before) onRead()
    if (reading.value.length > 0) timer = setTimeout(look, 700)
  }
  onMounted(() => {
    if (reading.value.length > 0) void look()
  })
  onScopeDispose(() => clearTimeout(timer))
  return { files, uploads, samples, reading, waiting: withStatus('waiting'), refused: withStatus('refused'), error, look }
}
