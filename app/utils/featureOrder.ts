import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { METHOD, REASON_LABELS, REASONS } from '#shared/science/verdict/reasons'
import { COUNTED_VERDICTS, VERDICTS } from '#shared/science/verdict/verdicts'
import { stableOrder } from '~/utils/stableOrder'

/** By what the feature table can be sorted. */
export const SORT_KEYS = [
  'number', 'mz', 'minutes', 'verdict', 'ratio', 'q', 'reach', 'levelA', 'levelB', 'foundA', 'foundB', 'intensity',
  'mass', 'low', 'high', 'p', 'equivalenceP', 'method', 'atLeast', 'traceRatio', 'blankA', 'blankB', 'reason', 'flags',
] as const
export type SortKey = (typeof SORT_KEYS)[number]
export interface FeatureSort { key: SortKey, descending: boolean }

/** So many keys can be sorted by at once. */
export const MOST_SORTS = 5
const GREATEST_FIRST: readonly SortKey[] = ['intensity', 'reach', 'levelA', 'levelB', 'atLeast', 'blankA', 'blankB', 'flags']

/** A sort the way it is asked for most: great intensities and reaches first, all else in ascending order. */
export const usualSort = (key: SortKey): FeatureSort => ({ key, descending: GREATEST_FIRST.includes(key) })

/** The sort that goes by one key alone; a second time by it turns the order round. */
export function sortedBy(sorts: readonly FeatureSort[], key: SortKey): FeatureSort[] {
  const [first, ...more] = sorts
  return [first?.key === key && more.length === 0 ? { key, descending: !first.descending } : usualSort(key)]
}

/** One more key at the end; one that stands is turned round, then goes, unless it stands alone. */
export function sortedAlsoBy(sorts: readonly FeatureSort[], key: SortKey): FeatureSort[] {
  const standing = sorts.find(each => each.key === key)
  if (!standing) return [...sorts, usualSort(key)].slice(0, MOST_SORTS)
  const isTurned = standing.descending !== usualSort(key).descending
  if (isTurned && sorts.length > 1) return sorts.filter(each => each !== standing)
  return sorts.map(each => each === standing ? { key, descending: !each.descending } : each)
}

const PLACE_IN_BAR = VERDICTS.map(name => (COUNTED_VERDICTS as readonly string[]).indexOf(name))

/** Each reason's place among the words for them. */
const PLACE_OF_REASON = REASONS.map((name, _, all) => all.toSorted((one, other) => REASON_LABELS[one].localeCompare(REASON_LABELS[other], 'en')).indexOf(name))
const NO_FLAGS: ReadonlyMap<number, readonly unknown[]> = new Map()

/** The values a sort goes by, one a feature; NaN stands last in both directions. */
export function sortValues(columns: VerdictColumns, key: SortKey, flags = NO_FLAGS): ArrayLike<number> {
  switch (key) {
    case 'number': return Float64Array.from({ length: columns.mz.length }, (_, i) => i)
    // A neutral mass lies by the same shift below or above every m/z.
    case 'mz': case 'mass': return columns.mz
    case 'minutes': return columns.retentionMinutes
    case 'verdict': return Float64Array.from(columns.verdict, code => PLACE_IN_BAR[code] ?? Number.NaN)
    case 'ratio': return columns.log2Ratio
    case 'q': return columns.q
    case 'reach': return columns.reach
    case 'levelA': return columns.levelA
    case 'levelB': return columns.levelB
    case 'foundA': return columns.detectedA
    case 'foundB': return columns.detectedB
    case 'intensity': return columns.highestCounts
    case 'low': return columns.low
    case 'high': return columns.high
    case 'p': return columns.p
    case 'equivalenceP': return columns.equivalenceP
    case 'atLeast': return columns.atLeast
    case 'traceRatio': return columns.traceRatio
    case 'blankA': return columns.blankRatioA
    case 'blankB': return columns.blankRatioB
    case 'method': return Float64Array.from(columns.method, code => code === METHOD.none ? Number.NaN : code)
    case 'reason': return Float64Array.from(columns.reason, code => PLACE_OF_REASON[code] ?? Number.NaN)
    case 'flags': return Float64Array.from({ length: columns.mz.length }, (_, i) => flags.get(i)?.length ?? Number.NaN)
  }
}

/** All features in the order of these sorts, the first foremost; equal ones by their number, those without a value last. */
export function orderFeatures(columns: VerdictColumns, sorts: readonly FeatureSort[], flags = NO_FLAGS): Int32Array {
  return stableOrder(columns.mz.length, sorts.map(({ key, descending }) => ({ values: sortValues(columns, key, flags), descending })))
}
