import type { AmountField } from '../normalisation/amountFactors'
import type { Preparation } from './preparations'
import type { ComparedSample } from './settings'
import type { SideStatistics } from './sideStatistics'
import type { SideTraces } from './sideTraces'

/** What summariseSides reads. `intensity` has one column a sample, NaN = not detected; the rest is of the alignment. */
export interface SideInput {
  samples: readonly ComparedSample[]
  intensity: readonly Float64Array[]
  mz: Float64Array
  retentionMinutes: Float64Array
  /** Features within tolerance of each: `neighbourList` from neighbourStart[i] up to neighbourStart[i + 1]. */
  neighbourStart: Int32Array
  neighbourList: Int32Array
  normaliseByAmount: boolean
  /** One a sample: the highest signal of each feature in its trace, counts; 0: nothing there, NaN: not covered. Null, or absent: no trace. */
  traceMaxima?: readonly (Float64Array | null)[]
}

/** One side, before any limit is applied. */
export interface SummarisedSide extends SideStatistics {
  /** Number of preparations compared. */
  preparations: number
  /** Mean of detected values, injected signal (per µL where volumes are known); NaN where not detected or no blanks. */
  injectedSignal: Float64Array
  /** What turns the blanks' signal into the highest normalised level it stands for in this side's samples. */
  blankScale: number
  /** The neighbour that this side holds most of; -1: none of the neighbours holds this side. */
  neighbour: Int32Array
  traces: SideTraces
  /** All its tables state peak heights. */
  allHeights: boolean
}

/** All of a comparison that does not depend on its limits: made once, then decideVerdicts is quick. */
export interface SideSummary {
  features: number
  samples: readonly ComparedSample[]
  mz: Float64Array
  retentionMinutes: Float64Array
  normaliseByAmount: boolean
  /** Per sample; NaN: not compared. */
  factor: Float64Array
  absoluteFactor: Float64Array
  amountUnit: 'mg' | 'mL' | null
  takenAsEqual: AmountField[]
  leftOut: { index: number, why: string }[]
  preparations: Preparation[]
  /** One column a preparation: log2 of normalised intensity, NaN = not detected. */
  log2: Float64Array[]
  a: SummarisedSide
  b: SummarisedSide
  /** Highest intensity of the feature over all tables, in counts; NaN: none. */
  highestCounts: Float64Array
  blankKind: 'processBlank' | 'solventBlank' | null
  /** Mean of detected values of the blanks; NaN where none detects. */
  blankSignal: Float64Array
  /** The blank check was made per µL injected (all volumes known) or per injection. */
  blankPerUl: boolean
  /** Welch on log2, B − A, where both sides have two detecting preparations or more; else NaN. */
  log2Ratio: Float64Array
  standardError: Float64Array
  degreesOfFreedom: Float64Array
  p: Float64Array
  low: Float64Array
  high: Float64Array
}
