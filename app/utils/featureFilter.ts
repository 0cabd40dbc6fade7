import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { VERDICT, VERDICTS, type Verdict } from '#shared/science/verdict/verdicts'

/** Does a feature pass? */
export type FeatureRule = (feature: number) => boolean

export interface FeatureFilter {
  /** Empty: all that are compared. */
  verdicts: readonly Verdict[]
  /** A feature passes where all of them say so. */
  rules: readonly FeatureRule[]
}

/** The features of `order` that pass the filter, in that order. A feature in neither side is never among them. */
export function filterFeatures(columns: VerdictColumns, order: Int32Array, { verdicts, rules }: FeatureFilter): Int32Array {
  const wanted = VERDICTS.map(name => name !== 'inNeither' && (verdicts.length === 0 || verdicts.includes(name)))
  const rows = new Int32Array(order.length)
  let count = 0
  for (const i of order) {
    if (wanted[columns.verdict[i] ?? VERDICT.inNeither] && rules.every(passes => passes(i))) rows[count++] = i
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
