import type { StudyTables } from '#shared/types/table'
import { useStudyFiles } from '~/composables/useStudyFiles'

/** A study's tables and files on their way. */
export async function useStudyTables(studyId: string, onRead: () => void) {
  const { files, ...rest } = await useStudyFiles<StudyTables>(`/api/studies/${studyId}/tables`, found => found.tables.length, onRead)
  return { ...rest, tables: computed(() => files.value?.tables ?? []) }
}
