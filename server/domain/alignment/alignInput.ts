import type { AlignmentResult, FeatureTable } from '../../../shared/science/alignment/types'
import type { AlignmentSettings } from '../../../shared/science/alignment/settings'

/** What an align job holds: everything is fixed when it is asked for. */
export interface AlignInput {
  tableIds: string[]
  settings: AlignmentSettings
  asGiven: boolean
  practice: boolean
  rerunOf: string | null
}

/** What the worker gets; `wide` per table where its rows are taken as given: its file, and the row of each feature. */
export interface AlignTask {
  tables: FeatureTable[]
  wide: ({ group: string, row: Int32Array } | null)[]
  settings: AlignmentSettings
}

/** What the worker gives back: the result, and each table's intensities by group (NaN = not detected). */
export interface AlignedResult {
  result: AlignmentResult
  intensity: Float64Array[]
}
