import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { METHOD } from '#shared/science/verdict/reasons'
import { formatMinutes, formatMz } from '~/utils/formatMeasures'
import { formatFold, formatLog2, formatProbability, formatTimes } from '~/utils/formatStatistics'

/** What a mark says under the pointer: which feature, its verdict, and the numbers it stands on. */
export function featureHint(columns: VerdictColumns, i: number, foldLimit: number, names: SideNames): string[] {
  const log2Ratio = columns.log2Ratio[i]!
  const q = columns.q[i]!
  const lines = [
    `m/z ${formatMz(columns.mz[i]!)}, ${formatMinutes(columns.retentionMinutes[i]!)} min`,
    verdictPhrase(columns.verdict[i] ?? 0, foldLimit, names, { reason: columns.reason[i]!, atLeast: columns.atLeast[i]! }),
  ]
  if (Number.isFinite(log2Ratio)) lines.push(`${formatFold(log2Ratio, names)} (log2 ${formatLog2(log2Ratio)})`)
  if (Number.isFinite(q)) lines.push(`q ${formatProbability(q)}`)
  else if (columns.method[i] === METHOD.assumed) lines.push('assumed precision')
  if (Number.isFinite(columns.reach[i]!)) lines.push(`reach ${formatTimes(columns.reach[i]!)}`)
  return lines
}
