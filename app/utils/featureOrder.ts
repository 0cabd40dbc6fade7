import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { COUNTED_VERDICTS, VERDICTS } from '#shared/science/verdict/verdicts'

/** By what the feature table can be sorted. */
export const SORT_KEYS = ['number', 'mz', 'minutes', 'verdict', 'ratio', 'q', 'reach', 'levelA', 'levelB', 'foundA', 'foundB', 'intensity'] as const
export type SortKey = (typeof SORT_KEYS)[number]
export interface FeatureSort { key: SortKey, descending: boolean }

const PLACE_IN_BAR = VERDICTS.map(name => (COUNTED_VERDICTS as readonly string[]).indexOf(name))

/** The values a sort goes by, one a feature; NaN stands last in both directions. */
export function sortValues(columns: VerdictColumns, key: SortKey): ArrayLike<number> {
  switch (key) {
    case 'number': return Float64Array.from({ length: columns.mz.length }, (_, i) => i)
    case 'mz': return columns.mz
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
  }
}

/** All features in the order of a sort; equal ones by their number, those without a value last. */
export function orderFeatures(columns: VerdictColumns, { key, descending }: FeatureSort): Int32Array {
  const values = sortValues(columns, key)
  const order = new Int32Array(columns.mz.length)
  let known = 0
  for (let i = 0; i < order.length; i++) if (!Number.isNaN(values[i])) order[known++] = i
  const turn = descending ? -1 : 1
  order.subarray(0, known).sort((i, j) => turn * (values[i]! - values[j]!) || i - j)
  let last = known
  for (let i = 0; i < order.length; i++) if (Number.isNaN(values[i])) order[last++] = i
  return order
}
