import type { ComparisonSettings } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'
import type { StoredSample } from './storedSample'

/** What a comparing job is asked to do: all a version holds, but for its verdicts. */
export interface CompareInput {
  /** null: a new comparison. */
  comparisonId: string | null
  title: string
  practice: boolean
  alignmentId: string
  sideAName: string
  sideBName: string
  settings: ComparisonSettings
  samples: StoredSample[]
  /** Raw data to look into; absent: none. */
  traces?: UsedTrace[]
}
