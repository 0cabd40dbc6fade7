import { ascendingOrder } from '../numeric/ascendingOrder'
import type { Centroids } from './centroids'

/**
 * Sorts points by m/z, those of equal m/z as they came, and gives each scan its place in the order of time.
 *
 * @param points in any order; not changed
 * @param place the place of each scan among the scans of the trace (timeOrder)
 */
export function sortCentroids({ mz, intensity, scan }: Centroids, place: Int32Array): Centroids {
  const order = ascendingOrder(mz)
  return { mz: Float64Array.from(order, i => mz[i]!), intensity: Float64Array.from(order, i => intensity[i]!), scan: Int32Array.from(order, i => place[scan[i]!]!) }
}
