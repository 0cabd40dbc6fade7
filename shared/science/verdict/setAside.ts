import { isAboveBlank } from '../normalisation/blankCheck'
import { REASON } from './reasons'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'

const NOT_SET_ASIDE = -1

/** The reason code for which a feature is set aside, or -1. */
export type SetAsideRule = (feature: number) => number

/** Makes the first rule of verdicts, set aside: sent to waste, below the intensity limit, blank-borne, by hand. */
export function setAsideRule(summary: SideSummary, settings: ComparisonSettings): SetAsideRule {
  const byHand = new Set(settings.setAsideByHand.map(({ index }) => index))
  const { divertWindows, intensityLimit, blankRatio } = settings
  return (i) => {
    const minutes = summary.retentionMinutes[i]!
    if (divertWindows.some(window => minutes >= window.startMinutes && minutes <= window.endMinutes)) return REASON.divert
    if (intensityLimit !== null && !(summary.highestCounts[i]! >= intensityLimit)) return REASON.intensityLimit
    if (summary.blankKind) {
      const blank = summary.blankSignal[i]!
      if (!isAboveBlank(summary.a.injectedSignal[i]!, blank, blankRatio) && !isAboveBlank(summary.b.injectedSignal[i]!, blank, blankRatio)) return REASON.blankBorne
    }
    return byHand.has(i) ? REASON.byHand : NOT_SET_ASIDE
  }
}

/** Which side is detected but not above blank (1 A, 2 B), where the other side is above; 0 neither. */
export function notAboveBlank(summary: SideSummary, i: number, blankRatio: number): number {
  if (!summary.blankKind) return 0
  const blank = summary.blankSignal[i]!
  if (summary.a.detected[i]! > 0 && !isAboveBlank(summary.a.injectedSignal[i]!, blank, blankRatio)) return 1
  if (summary.b.detected[i]! > 0 && !isAboveBlank(summary.b.injectedSignal[i]!, blank, blankRatio)) return 2
  return 0
}
