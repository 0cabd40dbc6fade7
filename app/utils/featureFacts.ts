import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { METHOD } from '#shared/science/verdict/reasons'
import { counted, threeDigits } from '#shared/science/numeric/numberWords'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import { formatIntensity } from '~/utils/formatMeasures'
import { formatFold, formatLog2, formatProbability, formatTimes } from '~/utils/formatStatistics'

export interface FeatureFact { term: string, value: string, remark?: string }

/** The numbers of one feature's verdict, only those that apply. */
export function featureFacts({ columns, preparationsA, preparationsB }: VerdictResult, i: number, settings: ComparisonSettings, names: SideNames): FeatureFact[] {
  const facts: FeatureFact[] = []
  const number = (values: Float64Array) => values[i] ?? Number.NaN
  const log2Ratio = number(columns.log2Ratio)
  if (Number.isFinite(log2Ratio)) {
    const known = Number.isFinite(number(columns.low))
    facts.push({
      term: 'Ratio', value: `${formatFold(log2Ratio, names)}, log2 B/A ${formatLog2(log2Ratio)}`,
      remark: known ? `95 % interval ${formatLog2(number(columns.low))} to ${formatLog2(number(columns.high))} (log2, ${names.b} over ${names.a})` : 'without interval',
    })
  }
  if (Number.isFinite(number(columns.atLeast))) facts.push({ term: 'At least', value: formatTimes(number(columns.atLeast)), remark: 'lowest of the one over everything of the other' })
  if (columns.method[i] === METHOD.welch) facts.push({ term: 'Certainty', value: `q ${formatProbability(number(columns.q))}`, remark: `p ${formatProbability(number(columns.p))}, Welch t on log2${Number.isFinite(number(columns.equivalenceP)) ? `; equivalence p ${formatProbability(number(columns.equivalenceP))}` : ''}` })
  if (columns.method[i] === METHOD.assumed) facts.push({ term: 'Certainty', value: 'assumed precision', remark: `no p-value; every value is taken to scatter by ${threeDigits(settings.assumedCvPercent)} %` })
  if (Number.isFinite(number(columns.reach))) facts.push({ term: 'Reach', value: formatTimes(number(columns.reach)), remark: `above ${columns.notAboveBlank[i] ? 'what the blank shows, beside which the other side does not stand out' : 'the other side\'s highest floor'}; ${formatTimes(settings.reachLimit)} is asked` })
  const trace = traceFact(columns, i, settings)
  if (trace) facts.push(trace)
  facts.push({ term: names.a, value: `in ${columns.detectedA[i]} of ${preparationsA}`, remark: levelOf(number(columns.levelA)) })
  facts.push({ term: names.b, value: `in ${columns.detectedB[i]} of ${preparationsB}`, remark: levelOf(number(columns.levelB)) })
  const blanks = [[names.a, number(columns.blankRatioA)], [names.b, number(columns.blankRatioB)]] as const
  const shown = blanks.filter(([, ratio]) => Number.isFinite(ratio))
  if (shown.length > 0) facts.push({ term: 'Over blank', value: shown.map(([name, ratio]) => `${name} ${formatTimes(ratio)}`).join(', '), remark: `${formatTimes(settings.blankRatio)} is asked of one side` })
  return facts
}

/** What the traces of the side that lacks the feature show, where they were looked into. */
function traceFact({ traceRatio, traceSamples }: VerdictResult['columns'], i: number, { reachLimit }: ComparisonSettings): FeatureFact | null {
  const samples = traceSamples[i] ?? 0
  const ratio = traceRatio[i] ?? Number.NaN
  if (samples === 0) return null
  const remark = `in the other side's traces, ${counted(samples, 'sample')}`
  if (Number.isNaN(ratio)) return { term: 'Trace', value: 'not measured', remark: `${remark}: the side that shows it has no signal there to measure by` }
  return { term: 'Trace', value: ratio > 0 ? formatTimes(ratio) : 'nothing there', remark: `highest signal ${remark}, over the side that shows it; less than ${formatTimes(1 / reachLimit)} is asked` }
}

function levelOf(level: number): string | undefined {
  return Number.isFinite(level) ? `median ${formatIntensity(level)}, normalised` : undefined
}
