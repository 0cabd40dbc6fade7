import type { SideFloors } from './floors'
import { REASON } from './reasons'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import { checkTraces, isSignal, notChecked, type TraceCheck } from './traceRule'
import { VERDICT } from './verdicts'

export interface OneSidedOutcome {
  verdict: number
  reason: number
  reach: number
  neighbour: number
  trace: TraceCheck
}

/**
 * Second rule of verdicts: one side present, the other not found. `blankCountsAsFloor` where the other side was detected but
 * is not above blank: the blank's level then stands for its floor, and the present side must also stand reachLimit times
 * above what the other shows, or a limit crossed by a hair would make a one-sided feature of two like ones. No trace is asked
 * then: the signal that stands there is listed, and the blank check has judged it; its trace can only show the same signal again.
 */
export function oneSided(summary: SideSummary, settings: ComparisonSettings, i: number, present: 'A' | 'B', floors: { A: SideFloors, B: SideFloors }, blankCountsAsFloor: boolean): OneSidedOutcome {
  const other = present === 'A' ? 'B' : 'A'
  const neighbour = sideOf(summary, other).neighbour[i]!
  const reach = reachOf(summary, i, present, floors, blankCountsAsFloor)
  const trace = blankCountsAsFloor ? notChecked : checkTraces(summary, i, present)
  const unsettled = (reason: number) => ({ verdict: VERDICT.unsettled, reason, reach, neighbour, trace })
  if (neighbour >= 0) return unsettled(REASON.neighbour)
  if (isSignal(trace, settings.reachLimit)) return unsettled(REASON.signalInTrace)
  if (floors.A.unprovable.includes(true) || floors.B.unprovable.includes(true)) return unsettled(REASON.gapFilled)
  if (!(reach >= settings.reachLimit)) return unsettled(REASON.belowReach)
  const shownBesideBlank = blankCountsAsFloor ? sideOf(summary, other).median[i]! : 0
  if (sideOf(summary, present).median[i]! < settings.reachLimit * shownBesideBlank) return unsettled(REASON.blankOverlap)
  return { verdict: present === 'A' ? VERDICT.onlyA : VERDICT.onlyB, reason: REASON.foundOnly, reach, neighbour, trace }
}

/** Median normalised intensity of the side that shows the feature over the highest floor of the other. */
export function reachOf(summary: SideSummary, i: number, shown: 'A' | 'B', floors: { A: SideFloors, B: SideFloors }, blankCountsAsFloor: boolean): number {
  const other = shown === 'A' ? 'B' : 'A'
  const floor = floors[other].highest
  const blankLevel = blankCountsAsFloor ? summary.blankSignal[i]! * sideOf(summary, other).blankScale : 0
  return sideOf(summary, shown).median[i]! / Math.max(floor, blankLevel)
}

function sideOf(summary: SideSummary, side: 'A' | 'B') {
  return side === 'A' ? summary.a : summary.b
}
