import { csvLine, csvLines, type CsvCell } from '../../../shared/formats/delimitedText/writeCsv'
import { unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { canExportWork } from '../../../shared/permissions'
import { reasonSentence } from '../../../shared/science/verdict/reasonSentence'
import { METHODS, REASON_LABELS, REASONS } from '../../../shared/science/verdict/reasons'
import { settingWords } from '../../../shared/science/verdict/settingWords'
import type { ComparisonSettings } from '../../../shared/science/verdict/settings'
import { verdictPhrase } from '../../../shared/science/verdict/verdictPhrase'
import type { VerdictResult } from '../../../shared/science/verdict/verdictResult'
import type { Database } from '../../db/open'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from '../study/findVisibleStudy'
import { findComparison } from './findComparison'
import { readComparison } from './readComparison'
import { versionColumns } from './readVersion'
import { unzip } from './unzip'

const ROWS_AT_ONCE = 200

export interface VerdictCsv { fileName: string, chunks: AsyncGenerator<string> }

/** The verdicts of a version as CSV in chunks, so that a long one does not hold up other requests. */
export function verdictCsv(db: Database, study: VisibleStudy, comparisonId: string, person: Person, number?: number): VerdictCsv {
  const comparison = findComparison(db, study.id, comparisonId, person)
  if (!canExportWork(person, comparison)) throw new DomainError('forbidden', 'Your roles do not allow exports of official work.')
  const { version, title } = readComparison(db, study.id, comparisonId, person, number)
  const packed = versionColumns(db, version.id)
  const notes = [
    `Steelyard: verdicts of “${title}”, version ${version.number}, study “${study.title}”${comparison.practice ? ', practice copy' : ''}`,
    `Side A: ${version.sideAName}. Side B: ${version.sideBName}. Ratios are B over A.`,
    `Saved ${version.createdAt} by ${version.createdByName}. Engine version ${version.engineVersion}, alignment ${version.alignmentNumber}.`,
    ...settingWords(version.settings).map(([name, value]) => `${name}: ${value}`),
    ...version.samples.flatMap(sample => sample.kind === 'sample' && sample.side ? [`Sample ${sample.name}: side ${sample.side}, preparation ${sample.preparation || sample.name}, floor ${sample.floor ?? 'not known'} (${sample.floorSource})`] : []),
    ...version.tables.map(table => `Table of ${table.sampleName}: ${table.fileName}, SHA-256 ${table.digest}`),
    ...version.cautions.map(caution => `Caution: ${caution}`),
    ...version.sheetChanges.map(change => `Sample sheet changed since: ${change}`),
  ]
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

type Names = { a: string, b: string }

function header({ a, b }: Names): string[] {
  return [
    'feature', 'm/z', 'retention time (min)', 'verdict', 'reason', 'reason in words', 'ratio B/A', 'log2 ratio B/A', 'log2 low 95 %', 'log2 high 95 %',
    'judged by', 'p', 'q', 'p equivalence', 'reach', 'at least (times)', `preparations found, ${a}`, `preparations, ${a}`, `preparations found, ${b}`, `preparations, ${b}`,
    `median normalised intensity, ${a}`, `median normalised intensity, ${b}`, `over blank, ${a}`, `over blank, ${b}`,
  ]
}

const METHOD_WORDS = { none: '', welch: 'Welch t', assumed: 'assumed precision' } as const

function row(i: number, result: VerdictResult, settings: ComparisonSettings, names: Names): CsvCell[] {
  const c = result.columns
  const reason = REASONS[c.reason[i]!]!
  return [
    i + 1, Number(c.mz[i]!.toFixed(6)), Number(c.retentionMinutes[i]!.toFixed(5)),
    verdictPhrase(c.verdict[i]!, settings.foldLimit, names, { reason: c.reason[i]!, atLeast: c.atLeast[i]! }), REASON_LABELS[reason], reasonSentence(i, result, settings, names),
    2 ** c.log2Ratio[i]!, c.log2Ratio[i]!, c.low[i]!, c.high[i]!, METHOD_WORDS[METHODS[c.method[i]!]!], c.p[i]!, c.q[i]!, c.equivalenceP[i]!, c.reach[i]!, c.atLeast[i]!,
    c.detectedA[i]!, result.preparationsA, c.detectedB[i]!, result.preparationsB, c.levelA[i]!, c.levelB[i]!, c.blankRatioA[i]!, c.blankRatioB[i]!,
  ]
}

