import { defineStore } from 'pinia'
import { emptyDraft, type SheetDraft } from '~/utils/sampleSheet/draft'

/** What was typed into sample sheets and is not saved: it outlives the page, so that a wrong cell is not lost by looking elsewhere. By person and study. */
export const useSheetDrafts = defineStore('sheetDrafts', () => {
  const drafts = ref<Record<string, SheetDraft>>({})
  function draftOf(personId: string, studyId: string): SheetDraft {
    const name = `${personId} ${studyId}`
    drafts.value[name] ??= emptyDraft()
    return drafts.value[name]
  }
  return { drafts, draftOf }
})
