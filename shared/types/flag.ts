import type { FlagKind } from '../schemas/flag'

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
