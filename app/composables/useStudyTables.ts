import type { StudyTables } from '#shared/types/table'

/** A study's tables and files on their way, asked again while something is being read. */
export async function useStudyTables(studyId: string, onRead: () => void) {
  const { data, error, refresh } = await useFetch<StudyTables>(`/api/studies/${studyId}/tables`, { key: `tables-${studyId}` })
  const tables = computed(() => data.value?.tables ?? [])
  const uploads = computed(() => data.value?.uploads ?? [])
  const samples = computed(() => data.value?.samples ?? [])
  const reading = computed(() => uploads.value.filter(line => line.status === 'reading'))
  const waiting = computed(() => uploads.value.filter(line => line.status === 'waiting'))
  const refused = computed(() => uploads.value.filter(line => line.status === 'refused'))
  let timer: ReturnType<typeof setTimeout> | undefined

  async function look() {
    clearTimeout(timer)
    const before = tables.value.length
    await refresh()
    if (tables.value.length !== before) onRead()
    if (reading.value.length > 0) timer = setTimeout(look, 700)
  }
  onMounted(() => {
    if (reading.value.length > 0) void look()
  })
  onScopeDispose(() => clearTimeout(timer))
  return { tables, uploads, samples, reading, waiting, refused, error, look }
}
