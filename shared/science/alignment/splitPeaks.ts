import { ascendingOrder } from '../numeric/ascendingOrder'
import type { Clusters } from './clusters'

/**
 * Marks the features of a piece that stand within tolerance of a more intense one of their own table: pieces of a split
 * peak, or lesser isomers, which are settled after all others. Of equal intensity, the first in canonical order is the greater.
 *
 * @param intensity of each loaded feature
 * @returns 1 for each such feature
 */
export function markSplitPeaks(clusters: Clusters, intensity: Float64Array): Uint8Array {
  const { size, rank, table, featureMz, featureMinutes, minutesTolerance } = clusters
  const lesser = new Uint8Array(size)
  const order = byTableAndTime(clusters)
  for (let i = 0; i < size; i++) {
    const feature = order[i]!
    for (const step of [-1, 1]) {
      for (let j = i + step; j >= 0 && j < size; j += step) {
        const other = order[j]!
        if (table[other] !== table[feature] || Math.abs(featureMinutes[other]! - featureMinutes[feature]!) > minutesTolerance) break
        const apart = Math.abs(featureMz[other]! - featureMz[feature]!)
        if (apart > clusters.massTolerance(0.5 * (featureMz[other]! + featureMz[feature]!))) continue
        if (intensity[other]! > intensity[feature]! || (intensity[other] === intensity[feature] && rank[other]! < rank[feature]!)) {
          lesser[feature] = 1
          break
        }
      }
      if (lesser[feature] === 1) break
    }
  }
  return lesser
}

function byTableAndTime({ size, table, featureMinutes }: Clusters): Int32Array {
  return ascendingOrder(Float64Array.from(table.subarray(0, size)), ascendingOrder(featureMinutes.slice(0, size)))
}
