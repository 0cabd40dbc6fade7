import { assumedLevel, assumedMoreLimit, assumedStandardError, chanceOfMore, ONE_SIDED_95, TWO_SIDED_95 } from '../statistics/assumedPrecision'
import { equivalenceP } from '../statistics/equivalence'
import { falseDiscovery } from '../statistics/falseDiscovery'
import { assumedRatio, testedRatio, type RatioOutcome } from './bothPresent'
import type { Deciding } from './decideFeature'
import { METHOD, REASON } from './reasons'
import type { VerdictResult } from './verdictResult'
import { VERDICT } from './verdicts'

/** What the ratios of a comparison rest on, counted. */
export type RatioCounts = Pick<VerdictResult, 'testedFeatures' | 'assumedFeatures' | 'chanceMore' | 'nothingCanBeLevel'>

/**
 * The fourth rule of verdicts, for the features whose both sides are present: tested where each side has two detecting preparations
 * or more, else judged by assumed precision. Only here stand p, q and intervals.
 */
export function decideRatios(deciding: Deciding, bothPresent: readonly number[]): RatioCounts {
  const { summary: { a, b }, summary, settings, columns } = deciding
  const counts: RatioCounts = { testedFeatures: 0, assumedFeatures: 0, chanceMore: 0, nothingCanBeLevel: nothingCanBeLevel(deciding) }
  const hasReplicates = (i: number) => a.detected[i]! > 1 && b.detected[i]! > 1
  for (const i of bothPresent) {
    if (!hasReplicates(i)) continue
    columns.p[i] = summary.p[i]!
    if (!Number.isNaN(summary.p[i]!)) counts.testedFeatures++
  }
  columns.q.set(falseDiscovery(columns.p))
  for (const i of bothPresent) {
    let outcome: RatioOutcome
    if (hasReplicates(i)) {
      outcome = decideTested(deciding, i)
    }
    else {
      const s = assumedStandardError(settings.assumedCvPercent, a.detected[i]!, b.detected[i]!)
      counts.assumedFeatures++
      counts.chanceMore += chanceOfMore(settings.foldLimit, s)
      outcome = decideAssumed(deciding, i, s)
    }
    columns.verdict[i] = outcome.verdict
    columns.reason[i] = outcome.reason
  }
  return counts
}

function decideTested({ summary, settings, columns }: Deciding, i: number): RatioOutcome {
  if (Number.isNaN(columns.p[i]!)) return { verdict: VERDICT.unsettled, reason: REASON.noSpread }
  const log2Ratio = columns.log2Ratio[i]!
  columns.method[i] = METHOD.welch
  columns.low[i] = summary.low[i]!
  columns.high[i] = summary.high[i]!
  if (Math.abs(log2Ratio) < settings.foldLimit) {
    columns.equivalenceP[i] = equivalenceP(log2Ratio, summary.standardError[i]!, summary.degreesOfFreedom[i]!, settings.foldLimit)
  }
  return testedRatio(log2Ratio, columns.q[i]!, columns.equivalenceP[i]!, settings.foldLimit, settings.alpha)
}

function decideAssumed({ settings: { foldLimit }, columns }: Deciding, i: number, s: number): RatioOutcome {
  const log2Ratio = columns.log2Ratio[i]!
  columns.method[i] = METHOD.assumed
  columns.low[i] = log2Ratio - TWO_SIDED_95 * s
  columns.high[i] = log2Ratio + TWO_SIDED_95 * s
  return assumedRatio(log2Ratio, assumedMoreLimit(foldLimit, s), assumedLevel(log2Ratio, foldLimit, s))
}

function nothingCanBeLevel({ summary: { a, b }, settings }: Deciding): boolean {
  if (a.preparations > 1 && b.preparations > 1) return false
  return ONE_SIDED_95 * assumedStandardError(settings.assumedCvPercent, a.preparations, b.preparations) >= settings.foldLimit
}
