/** Settings of an alignment; stored with its result and never changed afterwards. */
export interface AlignmentSettings {
  /** Between-table mass tolerance, ppm. */
  alignMassPpm: number
  /** Smallest mass tolerance, Da; null: follows the ppm (ppm × 200·10⁻⁶). */
  massFloorDa: number | null
  /** Retention tolerance to a group's centre, minutes. */
  retentionMinutes: number
  /** How far apart in time landmarks of two tables may lie, minutes. */
  landmarkWindowMinutes: number
  correctOffset: boolean
  correctDrift: boolean
  /** The reference table's digest; null: the table with most features. */
  referenceDigest: string | null
}

export const alignmentDefaults: AlignmentSettings = {
  alignMassPpm: 10,
  massFloorDa: null,
  retentionMinutes: 0.1,
  landmarkWindowMinutes: 1,
  correctOffset: true,
  correctDrift: true,
  referenceDigest: null,
}
