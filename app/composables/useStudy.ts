import type { InjectionKey } from 'vue'
import type { Action } from '#shared/permissions'
import type { StudyView } from '#shared/types/study'

export interface StudyContext {
  study: ComputedRef<StudyView>
  /** Asks the server again: after a change in the study. */
  refresh: () => Promise<void>
  /** The right, where the study is not archived: an archived one is only read. */
  may: (action: Action) => boolean
  sideName: (side: 'A' | 'B') => string
}

const key: InjectionKey<StudyContext> = Symbol('study')
const readOnly: readonly Action[] = ['readStudy', 'export', 'archive']

/** For the parent page alone: hands the study it has read to the pages below. */
export function provideStudy(study: ComputedRef<StudyView>, refresh: () => Promise<void>, may: (action: Action) => boolean): StudyContext {
  const context: StudyContext = {
    study,
    refresh,
    may: action => may(action) && (!study.value.archivedAt || readOnly.includes(action)),
    sideName: side => side === 'A' ? study.value.sideAName : study.value.sideBName,
  }
  provide(key, context)
  return context
}

/** The study whose pages these are. For pages and components below pages/studies/[studyId].vue. */
export function useStudy(): StudyContext {
  const context = inject(key)
  if (!context) throw new Error('useStudy is for what stands below the page of a study.')
  return context
}
