import type { CsvCell } from '#shared/formats/delimitedText/writeCsv'
import { flagKindNames } from '#shared/schemas/flag'
import { plainAdduct, usualIons, type Masses } from '#shared/science/mass/ionFits'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { METHOD, reasonLabel } from '#shared/science/verdict/reasons'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import type { FlagLine } from '#shared/types/flag'
import { adductWords } from '~/utils/adductWords'
import type { ColumnId } from '~/utils/columnLayout'
import type { AskedIons } from '~/utils/featureRules'
import type { SortKey } from '~/utils/featureOrder'
import { formatIntensity, formatMinutes, formatMz, formatPpm, NO_NUMBER } from '~/utils/formatMeasures'
import { formatFold, formatLog2, formatProbability, formatTimes } from '~/utils/formatStatistics'

/** A column of the feature table. */
export interface FeatureColumn {
  /** `fit` stands by itself while a formula or a neutral mass is looked for. */
  id: ColumnId | 'fit'
  /** In the head of the table; and in full, for lists of columns and exports. */
  label: string
  title: string
  widthRem: number
  /** Takes what room is left. */
  grows?: boolean
  isNumber: boolean
  /** By what it sorts; null: it does not. */
  sort: SortKey | null
  cell: (feature: number) => string
  /** In full precision: on hover, in copies and exports. */
  exact: (feature: number) => CsvCell
}

/** What the columns are written from. */
export interface ColumnSources {
  result: VerdictResult
  foldLimit: number
  names: SideNames
  masses: Masses
  flags: ReadonlyMap<number, FlagLine[]>
  /** What the filter looks for by the m/z of its ions. */
  asked: readonly AskedIons[]
}

/** All columns that a person may choose, in their usual order. */
export function featureColumns({ result, foldLimit, names, masses, flags }: ColumnSources): FeatureColumn[] {
  const { columns: c, preparationsA, preparationsB } = result
  const number = (id: SortKey, label: string, title: string, widthRem: number, values: ArrayLike<number>, format: (value: number) => string, more: Partial<FeatureColumn> = {}): FeatureColumn =>
    ({ id, label, title, widthRem, isNumber: true, sort: id, cell: i => format(values[i]!), exact: i => values[i], ...more })
  const text = (id: SortKey, label: string, title: string, widthRem: number, words: (feature: number) => string, more: Partial<FeatureColumn> = {}): FeatureColumn =>
    ({ id, label, title, widthRem, isNumber: false, sort: id, cell: words, exact: words, ...more })
  const [plain] = usualIons(0, masses)
  const asIon = masses.massKind === 'neutral' ? 'as measured' : `if ${adductWords(plainAdduct(masses.polarity))}`
  const neutral = Float64Array.from(c.mz, mz => mz - (plain?.mz ?? 0))
  const method = (i: number) => c.method[i] === METHOD.welch ? 'Welch t' : c.method[i] === METHOD.assumed ? 'assumed precision' : ''
  return [
    { id: 'flags', label: 'flags', title: 'flags', widthRem: 4, isNumber: false, sort: 'flags', cell: i => flagWords(flags.get(i)), exact: i => (flags.get(i) ?? []).map(flag => `${flagKindNames[flag.kind]}: ${flag.reason}`).join('; ') },
    { id: 'number', label: '#', title: 'feature', widthRem: 4, isNumber: true, sort: 'number', cell: i => String(i + 1), exact: i => i + 1 },
    number('mz', 'm/z', 'm/z', 6, c.mz, formatMz),
    number('minutes', 'min', 'retention time (min)', 4, c.retentionMinutes, formatMinutes),
    text('verdict', 'Verdict', 'verdict', 15, i => verdictPhrase(c.verdict[i] ?? 0, foldLimit, names, { reason: c.reason[i]!, atLeast: c.atLeast[i]! })),
    number('ratio', 'log2 B/A', 'log2 ratio B/A', 5, c.log2Ratio, formatLog2),
    number('low', 'low', 'log2 ratio, low end of 95 %', 4.5, c.low, formatLog2),
    number('high', 'high', 'log2 ratio, high end of 95 %', 4.5, c.high, formatLog2),
    number('atLeast', 'at least', 'ratio at least (times)', 5, c.atLeast, formatTimes),
    number('p', 'p', 'p', 5.5, c.p, formatProbability),
    number('q', 'q', 'q', 5, c.q, formatProbability, { cell: i => c.method[i] === METHOD.assumed ? 'assumed' : formatProbability(c.q[i]!) }),
    number('equivalenceP', 'p equiv.', 'p of equivalence', 5.5, c.equivalenceP, formatProbability),
    text('method', 'judged by', 'judged by', 9, method),
    number('reach', 'reach', 'reach (times)', 5, c.reach, formatTimes),
    number('levelA', 'level A', `median normalised intensity, ${names.a}`, 6.75, c.levelA, formatIntensity),
    number('levelB', 'level B', `median normalised intensity, ${names.b}`, 6.75, c.levelB, formatIntensity),
    number('foundA', 'in A', `preparations found of ${preparationsA}, ${names.a}`, 3.5, c.detectedA, count => `${count}/${preparationsA}`),
    number('foundB', 'in B', `preparations found of ${preparationsB}, ${names.b}`, 3.5, c.detectedB, count => `${count}/${preparationsB}`),
    number('traceRatio', 'trace', 'signal in the other side\'s traces over the level of the present side (times)', 5, c.traceRatio, formatTimes),
    number('blankA', 'A/blank', `over blank, ${names.a} (times)`, 5, c.blankRatioA, formatTimes),
    number('blankB', 'B/blank', `over blank, ${names.b} (times)`, 5, c.blankRatioB, formatTimes),
    number('intensity', 'highest', 'highest intensity, counts', 6.75, c.highestCounts, formatIntensity),
    number('mass', 'M', `neutral mass ${asIon} (u)`, 6, neutral, formatMz),
    text('reason', 'Reason', 'reason', 11.5, i => reasonLabel(c.reason[i]!, c.notAboveBlank[i]!), { grows: true }),
  ]
}

/** The columns of a table in the order chosen. What is looked for by its ions stands behind those that stay. */
export function chosenColumns(all: readonly FeatureColumn[], shown: readonly ColumnId[], frozen: number, { result, asked }: Pick<ColumnSources, 'result' | 'asked'>): FeatureColumn[] {
  const chosen = shown.flatMap(id => all.find(column => column.id === id) ?? [])
  const fits = asked.map(each => fitColumn(each, result.columns.mz))
  return [...chosen.slice(0, frozen), ...fits, ...chosen.slice(frozen)]
}

function fitColumn({ what, of }: AskedIons, mz: Float64Array): FeatureColumn {
  const words = (i: number) => {
    const fit = of(mz[i]!)
    if (!fit) return NO_NUMBER
    // No error of −0.0.
    const ppm = Number(fit.errorPpm.toFixed(1)) + 0
    return `${adductWords(fit.adduct)} ${ppm > 0 ? '+' : ''}${formatPpm(ppm)} ppm`
  }
  return { id: 'fit', label: `m/z fits ${what}`, title: `m/z fits ${what} as (not an identification)`, widthRem: 13, isNumber: false, sort: null, cell: words, exact: words }
}

const flagWords = (lines: readonly FlagLine[] = []) => [...new Set(lines.map(flag => flagKindNames[flag.kind]))].join(', ')

/** What a cell says on hover where it shows less: the number in full, the ratio as times, and words that may be cut off. */
export function fullValue(column: FeatureColumn, feature: number, names: SideNames): string | undefined {
  const value = column.exact(feature)
  if (typeof value !== 'number') return column.isNumber || value === '' ? undefined : String(value)
  if (!Number.isFinite(value)) return undefined
  return column.id === 'ratio' ? `${formatFold(value, names)}; ${value}` : String(value)
}
