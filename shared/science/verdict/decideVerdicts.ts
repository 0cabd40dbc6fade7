import { cautionsOf } from './cautions'
import { decideFeature, type Deciding } from './decideFeature'
import { decideRatios } from './decideRatios'
import { sideFloors } from './floors'
import { setAsideRule } from './setAside'
import type { ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import { emptyColumns, type VerdictColumns, type VerdictResult } from './verdictResult'
import { VERDICTS, type Verdict } from './verdicts'

/**
 * Second of two stages: applies the limits to a summary and gives every feature its verdict and reason.
 * Quick enough to run at every change of a limit; the same function serves the page's preview and the saved version.
 */
export function decideVerdicts(summary: SideSummary, settings: ComparisonSettings): VerdictResult {
  const { a, b, features } = summary
  const columns = emptyColumns(features)
  columns.log2Ratio.set(summary.log2Ratio)
  const deciding: Deciding = {
    summary, settings, columns,
    floors: { A: sideFloors(summary, 'A', settings.intensityLimit), B: sideFloors(summary, 'B', settings.intensityLimit) },
    setAside: setAsideRule(summary, settings),
  }
  const bothPresent: number[] = []
  for (let i = 0; i < features; i++) {
    columns.blankRatioA[i] = a.injectedSignal[i]! / summary.blankSignal[i]!
    columns.blankRatioB[i] = b.injectedSignal[i]! / summary.blankSignal[i]!
    if (decideFeature(deciding, i)) bothPresent.push(i)
  }
  const ratios = decideRatios(deciding, bothPresent)
  const result = {
    columns: withSummary(columns, summary),
    preparationsA: a.preparations,
    preparationsB: b.preparations,
    samplesA: a.traces.samples,
    samplesB: b.traces.samples,
    counts: countVerdicts(columns.verdict),
    ...ratios,
  }
  return { ...result, cautions: cautionsOf(summary, settings, result) }
}

function withSummary(columns: Deciding['columns'], { a, b, mz, retentionMinutes, highestCounts }: SideSummary): VerdictColumns {
  return {
    ...columns, mz, retentionMinutes, highestCounts,
    detectedA: a.detected, detectedB: b.detected, injectionsA: a.injections, injectionsB: b.injections, levelA: a.median, levelB: b.median,
  }
}

function countVerdicts(codes: Uint8Array): Record<Verdict, number> {
  const counts = Object.fromEntries(VERDICTS.map(name => [name, 0])) as Record<Verdict, number>
  for (const code of codes) counts[VERDICTS[code]!]++
  return counts
}
