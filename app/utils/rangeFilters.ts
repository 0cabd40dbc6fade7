import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import type { NumberRange } from '~/utils/numberRange'
import { rangeRule } from '~/utils/numberRange'

/** A filter by from and to over one column. */
export interface RangeFilter {
  label: string
  unit?: string
  /** Its name in the address. */
  key: string
  /** Said below its fields. */
  hint?: string
  /** How a bound is written in words. */
  words: (bound: number) => string
  rule: (columns: VerdictColumns, range: NumberRange) => (feature: number) => boolean
}

const plain = (column: 'mz' | 'retentionMinutes' | 'log2Ratio' | 'q' | 'reach' | 'highestCounts') => (columns: VerdictColumns, range: NumberRange) => rangeRule(columns[column], range)
const minus = (bound: number) => String(bound).replace('-', '−')

/** The filters by from and to. Features without the number do not pass. */
export const RANGE_FILTERS = {
  mzRange: { label: 'm/z', key: 'mzs', words: minus, rule: plain('mz') },
  minutes: { label: 'Minutes', unit: 'min', key: 'min', words: bound => `${minus(bound)} min`, rule: plain('retentionMinutes') },
  ratio: { label: 'log2 B/A', key: 'log2', hint: 'negative: more in A', words: minus, rule: plain('log2Ratio') },
  fold: { label: 'Ratio, either way', unit: '×', key: 'times', hint: '2: at least ×2 in A or in B', words: bound => `×${minus(bound)}`, rule: foldRule },
  q: { label: 'q', key: 'q', words: minus, rule: plain('q') },
  reach: { label: 'Reach', unit: '×', key: 'reach', words: bound => `×${minus(bound)}`, rule: plain('reach') },
  intensity: { label: 'Highest counts', key: 'highest', words: minus, rule: plain('highestCounts') },
} as const satisfies Record<string, RangeFilter>

export type RangeName = keyof typeof RANGE_FILTERS
export const RANGE_NAMES = Object.keys(RANGE_FILTERS) as RangeName[]

/** The ratio of the greater side to the smaller one, whichever it is. */
function foldRule({ log2Ratio }: VerdictColumns, { from, to }: NumberRange): (feature: number) => boolean {
  const [least, most] = [from ?? 0, to ?? Number.POSITIVE_INFINITY]
  return (i) => {
    const fold = 2 ** Math.abs(log2Ratio[i] ?? Number.NaN)
    return fold >= least && fold <= most
  }
}
