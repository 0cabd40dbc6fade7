import { PRESENCE, presenceOf } from '../verdict/presence'
import type { VerdictResult } from '../verdict/verdictResult'
import { VERDICT } from '../verdict/verdicts'

/** Which features count: present in at least one side, or in both. */
export type FeaturesPresent = 'oneSide' | 'bothSides'

export interface ChosenFeatures {
  /** Places in the alignment, ascending. */
  features: Int32Array
  /** Left out: set aside; not present in the sides as asked. */
  setAside: number
  notPresent: number
}

/**
 * The features that principal components are taken of: not set aside, and present (enough preparations detect it) in at least one
 * side, or in both. A side that is not above the blanks counts as not found, as it does in verdicts.
 */
export function chooseFeatures({ columns, preparationsA, preparationsB }: Pick<VerdictResult, 'columns' | 'preparationsA' | 'preparationsB'>, presence: number, present: FeaturesPresent): ChosenFeatures {
  const total = columns.verdict.length
  const chosen = new Int32Array(total)
  const counts = { setAside: 0, notPresent: 0 }
  let length = 0
  for (let i = 0; i < total; i++) {
    if (columns.verdict[i] === VERDICT.setAside) {
      counts.setAside++
      continue
    }
    const a = columns.notAboveBlank[i] !== 1 && presenceOf(columns.detectedA[i]!, preparationsA, presence) === PRESENCE.present
    const b = columns.notAboveBlank[i] !== 2 && presenceOf(columns.detectedB[i]!, preparationsB, presence) === PRESENCE.present
    if (present === 'bothSides' ? a && b : a || b) chosen[length++] = i
    else counts.notPresent++
  }
  return { features: chosen.slice(0, length), ...counts }
}
