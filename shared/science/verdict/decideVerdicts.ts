import { assumedLevel, assumedMoreLimit, assumedStandardError, chanceOfMore, ONE_SIDED_95, TWO_SIDED_95 } from '../statistics/assumedPrecision'
import { equivalenceP } from '../statistics/equivalence'
import { falseDiscovery } from '../statistics/falseDiscovery'
import { assumedRatio, testedRatio } from './bothPresent'
import { cautionsOf } from './cautions'
import { sideFloors } from './floors'
import { oneSided, reachOf } from './oneSided'
import { patchy } from './patchy'
import { PRESENCE, presenceOf } from './presence'
import { METHOD, REASON } from './reasons'
import { notAboveBlank, setAsideRule } from './setAside'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import { emptyColumns, type VerdictResult } from './verdictResult'
import { VERDICT, VERDICTS, type Verdict } from './verdicts'

/**
 * Second of two stages: applies the limits to a summary and gives every feature its verdict and reason (METHODS 9, 10).
 * Quick enough to run at every change of a limit; the same function serves the page's preview and the saved version.
 */
export function decideVerdicts(summary: SideSummary, settings: ComparisonSettings): VerdictResult {
  const { a, b, features } = summary
  const columns = emptyColumns(features)
  const floors = { A: sideFloors(summary, 'A', settings.intensityLimit), B: sideFloors(summary, 'B', settings.intensityLimit) }
  const setAside = setAsideRule(summary, settings)
  const bothPresent: number[] = []
  const decide = (i: number, outcome: { verdict: number, reason: number }) => {
    columns.verdict[i] = outcome.verdict
    columns.reason[i] = outcome.reason
  }

  for (let i = 0; i < features; i++) {
    columns.blankRatioA[i] = a.injectedSignal[i]! / summary.blankSignal[i]!
    columns.blankRatioB[i] = b.injectedSignal[i]! / summary.blankSignal[i]!
    columns.log2Ratio[i] = summary.log2Ratio[i]!
    if (a.detected[i] === 0 && b.detected[i] === 0) {
      decide(i, { verdict: VERDICT.inNeither, reason: REASON.inNeither })
      continue
    }
    const aside = setAside(i)
    if (aside >= 0) {
      decide(i, { verdict: VERDICT.setAside, reason: aside })
      continue
    }
    const blankSide = notAboveBlank(summary, i, settings.blankRatio)
    columns.notAboveBlank[i] = blankSide
    if (blankSide > 0) columns.log2Ratio[i] = Number.NaN
    const inA = blankSide === 1 ? PRESENCE.notFound : presenceOf(a.detected[i]!, a.preparations, settings.presence)
    const inB = blankSide === 2 ? PRESENCE.notFound : presenceOf(b.detected[i]!, b.preparations, settings.presence)
    if (inA === PRESENCE.present && inB === PRESENCE.present) {
      bothPresent.push(i)
    }
    else if (inA !== PRESENCE.notFound && inB !== PRESENCE.notFound) {
      const present = inA === PRESENCE.present ? 'A' : inB === PRESENCE.present ? 'B' : null
      const outcome = patchy(summary, settings, i, present, floors)
      columns.atLeast[i] = outcome.atLeast
      decide(i, outcome)
    }
    else {
      const shown = inA === PRESENCE.notFound ? 'B' : 'A'
      if ((shown === 'A' ? inA : inB) === PRESENCE.patchy) {
        columns.reach[i] = reachOf(summary, i, shown, floors, blankSide > 0)
        decide(i, { verdict: VERDICT.unsettled, reason: REASON.patchy })
        continue
      }
      const outcome = oneSided(summary, settings, i, shown, floors, blankSide > 0)
      columns.reach[i] = outcome.reach
      columns.neighbour[i] = outcome.neighbour
      decide(i, outcome)
    }
  }

  const ratios = decideRatios(summary, settings, columns, bothPresent, decide)
  const counts = Object.fromEntries(VERDICTS.map(name => [name, 0])) as Record<Verdict, number>
  for (const code of columns.verdict) counts[VERDICTS[code]!]++
  const result = {
    columns: {
      ...columns,
      mz: summary.mz,
      retentionMinutes: summary.retentionMinutes,
      detectedA: a.detected, detectedB: b.detected,
      injectionsA: a.injections, injectionsB: b.injections,
      levelA: a.median, levelB: b.median,
      highestCounts: summary.highestCounts,
    },
    preparationsA: a.preparations,
    preparationsB: b.preparations,
    counts,
    ...ratios,
  }
  return { ...result, cautions: cautionsOf(summary, settings, result) }
}

/** Rule four: where both sides are present. Only here stand p, q and intervals. */
function decideRatios(summary: SideSummary, settings: ComparisonSettings, columns: ReturnType<typeof emptyColumns>, bothPresent: number[], decide: (i: number, outcome: { verdict: number, reason: number }) => void) {
  const { a, b } = summary
  const { foldLimit, alpha, assumedCvPercent } = settings
  let testedFeatures = 0
  let assumedFeatures = 0
  let chanceMore = 0
  for (const i of bothPresent) {
    if (a.detected[i]! < 2 || b.detected[i]! < 2) continue
    columns.p[i] = summary.p[i]!
    if (!Number.isNaN(summary.p[i]!)) testedFeatures++
  }
  columns.q.set(falseDiscovery(columns.p))
  for (const i of bothPresent) {
    const log2Ratio = columns.log2Ratio[i]!
    if (a.detected[i]! < 2 || b.detected[i]! < 2) {
      const s = assumedStandardError(assumedCvPercent, a.detected[i]!, b.detected[i]!)
      columns.method[i] = METHOD.assumed
      columns.low[i] = log2Ratio - TWO_SIDED_95 * s
      columns.high[i] = log2Ratio + TWO_SIDED_95 * s
      assumedFeatures++
      chanceMore += chanceOfMore(foldLimit, s)
      decide(i, assumedRatio(log2Ratio, assumedMoreLimit(foldLimit, s), assumedLevel(log2Ratio, foldLimit, s)))
    }
    else if (Number.isNaN(columns.p[i]!)) {
      decide(i, { verdict: VERDICT.unsettled, reason: REASON.noSpread })
    }
    else {
      columns.method[i] = METHOD.welch
      columns.low[i] = summary.low[i]!
      columns.high[i] = summary.high[i]!
      if (Math.abs(log2Ratio) < foldLimit) columns.equivalenceP[i] = equivalenceP(log2Ratio, summary.standardError[i]!, summary.degreesOfFreedom[i]!, foldLimit)
      decide(i, testedRatio(log2Ratio, columns.q[i]!, columns.equivalenceP[i]!, foldLimit, alpha))
    }
  }
  const withoutReplicates = a.preparations < 2 || b.preparations < 2
  const s = assumedStandardError(assumedCvPercent, a.preparations, b.preparations)
  return { testedFeatures, assumedFeatures, chanceMore, nothingCanBeLevel: withoutReplicates && ONE_SIDED_95 * s >= foldLimit }
}
