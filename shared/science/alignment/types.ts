/** What alignment needs of one feature table. The three columns are equally long; a row is one feature. */
export interface FeatureTable {
  /** SHA-256 of the table's columns: breaks ties, so that the order of tables does not matter. */
  digest: string
  /** A blank is never the reference. */
  blank: boolean
  /** Place in the run; a table with too few landmarks takes its neighbour's correction. */
  runOrder: number | null
  /** m/z, in (0, 10⁵). */
  mz: Float64Array
  /** Minutes, at least 0. */
  retentionMinutes: Float64Array
  /** In the table's own counts, above 0. */
  intensity: Float64Array
}

/** What was done about one table's mass offset and retention drift, and how well it fits afterwards. */
export interface TableDrift {
  /** Median mass difference of its landmarks to the reference, ppm; taken out where offsetApplied. */
  offsetPpm: number
  offsetApplied: boolean
  /** Points that the last drift curve rests on. */
  landmarks: number
  timeCorrected: boolean
  /** Input position of the table whose correction was taken over. */
  borrowedFrom: number | null
  /** All of this as a sentence with numbers. */
  reason: string
  /** The drift curve: the table's own minutes, ascending, and the shift subtracted there. Empty where time is not corrected. */
  knotMinutes: Float64Array
  knotShiftMinutes: Float64Array
  /** Over its features in groups of two or more: median distance to the group's centre. NaN where there are none. */
  residualMedianPpm: number
  residualMedianMinutes: number
  /** The same, signed: what is left of an offset. */
  massErrorPpm: number
}

/** Which features of the tables are the same. Tables stand in the order they were given. */
export interface AlignmentResult {
  /** Centre of each group: mean m/z (offsets taken out) and mean corrected minutes; ascending by m/z, then time. */
  mz: Float64Array
  retentionMinutes: Float64Array
  groupSize: Int32Array
  /** Per table, per group: the table's row, or −1. */
  members: Int32Array[]
  /** Per table, per row: corrected minutes. */
  correctedMinutes: Float64Array[]
  /** Per table: rows left out of a greater group because a nearer feature of the table stands in it, and that group. */
  leftOut: LeftOut[]
  drift: TableDrift[]
  /** The groups within tolerance of group g, nearest first: neighbourList[neighbourStart[g] … neighbourStart[g + 1]]; at most 64. */
  neighbourStart: Int32Array
  neighbourList: Int32Array
  /** Input position of the reference table; −1 where no table has features. */
  reference: number
  /** Pieces in which a table had several features or the tolerance to the centre was exceeded. */
  crowdedPieces: number
}

export interface LeftOut {
  rows: Int32Array
  groups: Int32Array
}

/** Told how far the alignment is: a share of the whole, and what is being done. */
export type AlignmentProgress = (share: number, stage: string) => void
