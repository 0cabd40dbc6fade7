import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { VERDICT, VERDICTS, type Verdict } from '#shared/science/verdict/verdicts'
import { searchRule, type FeatureSearch } from '~/utils/featureSearch'

export interface FeatureFilter {
  /** Empty: all that are compared. */
  verdicts: readonly Verdict[]
  /** Null: flagged or not. */
  flagged: ReadonlySet<number> | null
  search: FeatureSearch | null
  /** Does the feature lie inside the area drawn? Null: anywhere. */
  inside?: ((feature: number) => boolean) | null
  /** More words of a feature that a search may meet. */
  said: (feature: number) => string
}

/** The features of `order` that pass the filter, in that order. A feature in neither side is never among them. */
export function filterFeatures(columns: VerdictColumns, order: Int32Array, filter: FeatureFilter): Int32Array {
  const wanted = VERDICTS.map(name => name !== 'inNeither' && (filter.verdicts.length === 0 || filter.verdicts.includes(name)))
  const found = filter.search ? searchRule(filter.search, columns, filter.said) : null
  const rows = new Int32Array(order.length)
  let count = 0
  for (const i of order) {
    if (!wanted[columns.verdict[i] ?? VERDICT.inNeither]) continue
    if (filter.flagged && !filter.flagged.has(i)) continue
    if (filter.inside && !filter.inside(i)) continue
    if (found && !found(i)) continue
    rows[count++] = i
  }
  return rows.slice(0, count)
}

/** The same features in the order of `order`, which holds every feature once. */
export function inOrder(features: Int32Array, order: Int32Array): Int32Array {
  const passes = new Uint8Array(order.length)
  for (const feature of features) passes[feature] = 1
  return order.filter(feature => passes[feature] === 1)
}

/** Where each feature stands among the rows; −1 for those that do not. */
export function rowOfFeature(rows: Int32Array, features: number): Int32Array {
  const place = new Int32Array(features).fill(-1)
  rows.forEach((feature, row) => { place[feature] = row })
  return place
}
