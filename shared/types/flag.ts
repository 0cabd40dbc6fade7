import type { FlagKind } from '../schemas/flag'
import type { Verdict } from '../science/verdict/verdicts'

/** A flag that stands, as a page reads it. */
export interface FlagLine {
  id: string
  featureIndex: number
  kind: FlagKind
  reason: string
  /** Name of who set it, and when. */
  by: string
  at: string
}

/** The flags that stand on an alignment, and whether the person who asks may set and take back. */
export interface AlignmentFlags { flags: FlagLine[], mayFlag: boolean }

/** A flagged feature in the list of a study. */
export interface FlaggedFeature extends FlagLine {
  alignmentId: string
  alignmentNumber: number
  practice: boolean
  mz: number
  retentionMinutes: number
  /** The newest version that rests on its alignment, and its verdict there; null where there is none. */
  judged: JudgedFeature | null
}

export interface JudgedFeature {
  comparisonId: string
  title: string
  versionNumber: number
  sideAName: string
  sideBName: string
  verdict: Verdict
  /** The verdict in words. */
  phrase: string
}
