import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import { COUNTED_VERDICTS } from '#shared/science/verdict/verdicts'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { threeDigits, times } from '#shared/science/numeric/numberWords'
import type { FoldPoints } from '~/charts/foldPoints'
import { formatCount } from '~/utils/formatMeasures'

/** The fold-change plot in words, for who does not see it. The counts are of all features; `drawn` of them pass the filter. */
export function foldText(result: Pick<VerdictResult, 'counts' | 'testedFeatures'>, points: FoldPoints, settings: Pick<ComparisonSettings, 'foldLimit' | 'alpha' | 'reachLimit' | 'assumedCvPercent'>, names: SideNames, drawn?: number): string {
  const { counts } = result
  const all = COUNTED_VERDICTS.reduce((sum, name) => sum + counts[name], 0)
  const fold = times(2 ** settings.foldLimit)
  const upwards = points.kind === 'certainty'
    ? `Upwards the certainty of a ratio (−log10 q, ${formatCount(result.testedFeatures)} tested)`
    : `Upwards the abundance; no replicates, so ratios are judged at an assumed precision of ${threeDigits(settings.assumedCvPercent)} %`
  return [
    `Left is more in ${names.a} (${formatCount(counts.moreA)}), right more in ${names.b} (${formatCount(counts.moreB)}), between the lines level within ${fold} (${formatCount(counts.level)}).`,
    `${upwards}.`,
    `In the lanes stands what only one side shows, at its reach: found only in ${names.a} ${formatCount(counts.onlyA)}, only in ${names.b} ${formatCount(counts.onlyB)}; below ${times(settings.reachLimit)} the other side could not have shown it.`,
    drawn === undefined || drawn === all ? '' : drawn === 0 ? 'No feature passes the filter: none is drawn. The counts are of all.' : `Only the ${formatCount(drawn)} of ${formatCount(all)} that pass the filter are drawn; the counts are of all.`,
    points.untested > 0 ? `${formatCount(points.untested)} with a ratio but no test stand below the plot.` : '',
    points.notDrawn > 0 ? `${formatCount(points.notDrawn)} have neither ratio nor reach and stand in the table only.` : '',
  ].filter(Boolean).join(' ')
}
