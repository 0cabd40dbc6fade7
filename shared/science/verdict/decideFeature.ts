import type { SideFloors } from './floors'
import { oneSided, reachOf } from './oneSided'
import { patchy } from './patchy'
import { PRESENCE, presenceOf } from './presence'
import { REASON } from './reasons'
import { notAboveBlank, type SetAsideRule } from './setAside'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import type { DecidedColumns } from './verdictResult'
import { VERDICT } from './verdicts'

/** What every feature is decided by, and the columns that take the outcome. */
export interface Deciding {
  summary: SideSummary
  settings: ComparisonSettings
  floors: { A: SideFloors, B: SideFloors }
  setAside: SetAsideRule
  columns: DecidedColumns
}

/**
 * The first rules of verdicts for one feature, the first that holds: in neither side, set aside, one side present, patchy.
 * Gives true where none of them does: both sides are present, and their ratio decides.
 */
export function decideFeature(deciding: Deciding, i: number): boolean {
  const { summary: { a, b }, summary, settings, setAside, columns } = deciding
  if (a.detected[i] === 0 && b.detected[i] === 0) return decided(columns, i, VERDICT.inNeither, REASON.inNeither)
  const aside = setAside(i)
  if (aside >= 0) return decided(columns, i, VERDICT.setAside, aside)
  const blankSide = notAboveBlank(summary, i, settings.blankRatio)
  if (blankSide > 0) {
    columns.notAboveBlank[i] = blankSide
    columns.log2Ratio[i] = Number.NaN
  }
  const inA = blankSide === 1 ? PRESENCE.notFound : presenceOf(a.detected[i]!, a.preparations, settings.presence)
  const inB = blankSide === 2 ? PRESENCE.notFound : presenceOf(b.detected[i]!, b.preparations, settings.presence)
  if (inA === PRESENCE.present && inB === PRESENCE.present) return true
  if (inA !== PRESENCE.notFound && inB !== PRESENCE.notFound) {
    return decidePatchy(deciding, i, inA === PRESENCE.present ? 'A' : inB === PRESENCE.present ? 'B' : null)
  }
  const shown = inA === PRESENCE.notFound ? 'B' : 'A'
  return decideOneSided(deciding, i, shown, Math.max(inA, inB) === PRESENCE.present, blankSide > 0)
}

function decidePatchy({ summary, settings, floors, columns }: Deciding, i: number, present: 'A' | 'B' | null): false {
  const outcome = patchy(summary, settings, i, present, floors)
  columns.atLeast[i] = outcome.atLeast
  return decided(columns, i, outcome.verdict, outcome.reason)
}

function decideOneSided({ summary, settings, floors, columns }: Deciding, i: number, shown: 'A' | 'B', isPresent: boolean, blankCountsAsFloor: boolean): false {
  if (!isPresent) {
    columns.reach[i] = reachOf(summary, i, shown, floors, blankCountsAsFloor)
    return decided(columns, i, VERDICT.unsettled, REASON.patchy)
  }
  const outcome = oneSided(summary, settings, i, shown, floors, blankCountsAsFloor)
  columns.reach[i] = outcome.reach
  columns.neighbour[i] = outcome.neighbour
  columns.traceRatio[i] = outcome.trace.ratio
  columns.traceSamples[i] = outcome.trace.samples
  return decided(columns, i, outcome.verdict, outcome.reason)
}

function decided(columns: DecidedColumns, i: number, verdict: number, reason: number): false {
  columns.verdict[i] = verdict
  columns.reason[i] = reason
  return false
}
