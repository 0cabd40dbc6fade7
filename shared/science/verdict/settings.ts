import type { Measure } from '../table/layout'

/** A sample as a comparison saw it: a snapshot, kept with the version. */
export interface ComparedSample {
  id: string
  name: string
  kind: 'sample' | 'solventBlank' | 'processBlank' | 'pooledQc' | 'standard'
  side: 'A' | 'B' | null
  /** The side was chosen by hand, whatever the sample sheet says. */
  sideByHand?: true
  preparation: string
  amount: number | null
  amountUnit: 'mg' | 'mL' | null
  volumeMl: number | null
  dilution: number | null
  injectionUl: number | null
  runOrder: number | null
  batch: string | null
  /** Lowest intensity its table could have reported, in the table's counts. */
  floor: number
  floorSource: 'stated' | 'estimated'
  /** A wide column with under 1 % empty cells. */
  gapFilled: boolean
  measure: Measure
}

/** Limits and choices of a comparison. */
export interface ComparisonSettings {
  normaliseByAmount: boolean
  blankRatio: number
  /** Share of a side's preparations that must detect a feature for it to be present. */
  presence: number
  reachLimit: number
  /** log2. */
  foldLimit: number
  alpha: number
  assumedCvPercent: number
  intensityLimit: number | null
  /** Times sent to waste, minutes. */
  divertWindows: { startMinutes: number, endMinutes: number }[]
  test: 'welch'
  setAsideByHand: { index: number, reason: string }[]
}

export const comparisonDefaults: ComparisonSettings = {
  normaliseByAmount: true,
  blankRatio: 5,
  presence: 0.8,
  reachLimit: 3,
  foldLimit: 1,
  alpha: 0.05,
  assumedCvPercent: 20,
  intensityLimit: null,
  divertWindows: [],
  test: 'welch',
  setAsideByHand: [],
}
