import type { SideFloors } from './floors'
import { REASON } from './reasons'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import { VERDICT } from './verdicts'

export interface PatchyOutcome {
  verdict: number
  reason: number
  /** Lowest detected value of the present side over everything on the other; NaN where no side is present. */
  atLeast: number
}

/**
 * Third rule of verdicts: one side present, the other patchy. Clear where the lowest value of the present side stands
 * max(reachLimit, 2^foldLimit) times above everything on the other, floors standing for what was not found there.
 */
export function patchy(summary: SideSummary, settings: ComparisonSettings, i: number, present: 'A' | 'B' | null, floors: { A: SideFloors, B: SideFloors }): PatchyOutcome {
  if (present === null) return { verdict: VERDICT.unsettled, reason: REASON.patchy, atLeast: Number.NaN }
  const other = present === 'A' ? 'B' : 'A'
  const lowest = (present === 'A' ? summary.a : summary.b).lowest[i]!
  let highest = (other === 'A' ? summary.a : summary.b).highest[i]!
  let unprovable = false
  let at = 0
  summary.preparations.forEach((preparation, p) => {
    if (preparation.side !== other) return
    if (Number.isNaN(summary.log2[p]![i]!)) {
      highest = Math.max(highest, floors[other].ofPreparation[at]!)
      unprovable ||= floors[other].unprovable[at]!
    }
    at++
  })
  const atLeast = lowest / highest
  if (!(atLeast >= Math.max(settings.reachLimit, 2 ** settings.foldLimit))) return { verdict: VERDICT.unsettled, reason: REASON.patchy, atLeast }
  if (unprovable) return { verdict: VERDICT.unsettled, reason: REASON.gapFilled, atLeast }
  return { verdict: present === 'A' ? VERDICT.moreA : VERDICT.moreB, reason: REASON.patchyClear, atLeast }
}
