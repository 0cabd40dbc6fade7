import { csvLine, csvLines, type CsvCell } from '../../../shared/formats/delimitedText/writeCsv'
import { unpackVerdicts } from '../../../shared/formats/verdictColumns'
import type { SideNames } from '../../../shared/science/verdict/reasonFacts'
import { reasonSentence } from '../../../shared/science/verdict/reasonSentence'
import { METHODS, reasonLabel } from '../../../shared/science/verdict/reasons'
import type { ComparisonSettings } from '../../../shared/science/verdict/settings'
import { verdictPhrase } from '../../../shared/science/verdict/verdictPhrase'
import type { VerdictResult } from '../../../shared/science/verdict/verdictResult'
import { unzip } from './unzip'

const ROWS_AT_ONCE = 200

export interface VerdictCsv { fileName: string, chunks: AsyncGenerator<string> }

/** What the rows of a version's CSV are written from. */
export interface CsvVersion { number: number, sideAName: string, sideBName: string, settings: ComparisonSettings }

/** A version's packed verdicts as CSV below these notes, in chunks, so that a long one does not hold up other requests. */
export function versionCsv(version: CsvVersion, packed: Buffer, notes: string[]): VerdictCsv {
  const names = { a: version.sideAName, b: version.sideBName }
  async function* chunks() {
    yield `\uFEFF${[...csvLines(header(names), [], notes)].join('')}`
    const result = unpackVerdicts(await unzip(packed))
    for (let start = 0; start < result.columns.verdict.length; start += ROWS_AT_ONCE) {
      let text = ''
      for (let i = start; i < Math.min(start + ROWS_AT_ONCE, result.columns.verdict.length); i++) text += csvLine(row(i, result, version.settings, names))
      yield text
      await new Promise<void>(resolve => setImmediate(resolve))
    }
  }
  return { fileName: `steelyard-verdicts-version-${version.number}.csv`, chunks: chunks() }
}

function header({ a, b }: SideNames): string[] {
  return [
    'feature', 'm/z', 'retention time (min)', 'verdict', 'reason', 'reason in words', 'ratio B/A', 'log2 ratio B/A', 'log2 low 95 %', 'log2 high 95 %',
    'judged by', 'p', 'q', 'p equivalence', 'reach', 'at least (times)', 'trace of the other side (times)', 'traces of the other side', `preparations found, ${a}`, `preparations, ${a}`, `preparations found, ${b}`, `preparations, ${b}`,
    `median normalised intensity, ${a}`, `median normalised intensity, ${b}`, `over blank, ${a}`, `over blank, ${b}`,
  ]
}

const METHOD_WORDS = { none: '', welch: 'Welch t', assumed: 'assumed precision' } as const

function row(i: number, result: VerdictResult, settings: ComparisonSettings, names: SideNames): CsvCell[] {
  const c = result.columns
  return [
    i + 1, Number(c.mz[i]!.toFixed(6)), Number(c.retentionMinutes[i]!.toFixed(5)),
    verdictPhrase(c.verdict[i]!, settings.foldLimit, names, { reason: c.reason[i]!, atLeast: c.atLeast[i]! }), reasonLabel(c.reason[i]!, c.notAboveBlank[i]!), reasonSentence(i, result, settings, names),
    2 ** c.log2Ratio[i]!, c.log2Ratio[i]!, c.low[i]!, c.high[i]!, METHOD_WORDS[METHODS[c.method[i]!]!], c.p[i]!, c.q[i]!, c.equivalenceP[i]!, c.reach[i]!, c.atLeast[i]!, c.traceRatio[i]!, c.traceSamples[i] || null,
    c.detectedA[i]!, result.preparationsA, c.detectedB[i]!, result.preparationsB, c.levelA[i]!, c.levelB[i]!, c.blankRatioA[i]!, c.blankRatioB[i]!,
  ]
}

