import type { StudyTraces } from '#shared/types/trace'
import { useStudyFiles } from '~/composables/useStudyFiles'

/** A study's traces and mzML files on their way. */
export async function useStudyTraces(studyId: string, onRead: () => void) {
  const { files, ...rest } = await useStudyFiles<StudyTraces>(`/api/studies/${studyId}/traces`, found => found.traces.length, onRead)
  return { ...rest, traces: computed(() => files.value?.traces ?? []) }
}
