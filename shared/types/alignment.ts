import type { AlignmentSettings } from '../science/alignment/settings'

/** An alignment in a list. */
export interface AlignmentLine {
  id: string
  number: number
  practice: boolean
  asGiven: boolean
  settings: AlignmentSettings
  differs: string[]
  groups: number
  tables: number
  /** Comparisons that rest on it. */
  comparisons: number
  createdByName: string
  createdAt: string
}

/** What stands ready to be aligned, and what does not and why. */
export interface AlignableTables {
  tables: { id: string, sampleName: string, features: number, digest: string, blank: boolean, wide: boolean }[]
  withoutSample: string[]
  /** A reason why these can't be aligned together, as a sentence. */
  problem: string | null
}

export interface AlignmentList {
  alignments: AlignmentLine[]
  ready: AlignableTables
  /** Runs that wait or are under way. */
  jobs: { id: string, message: string, progress: number, practice: boolean }[]
}

/** One table's part in an alignment, with the drift curve as pairs. */
export interface AlignedTable {
  tableId: string
  sampleName: string
  fileName: string
  digest: string
  features: number
  /** Its features that stand in a group with at least one other table's. */
  matched: number
  leftOut: number
  offsetPpm: number
  offsetApplied: boolean
  timeCorrected: boolean
  landmarks: number
  reason: string
  drift: [minutes: number, shiftMinutes: number][]
  residualMedianPpm: number | null
  residualMedianMinutes: number | null
}

export interface AlignmentDetail extends AlignmentLine {
  engineVersion: string
  /** Position of the reference in `aligned`, or −1. */
  reference: number
  /** How many groups have 1, 2, 3 … tables. */
  groupSizes: number[]
  aligned: AlignedTable[]
}
