import { ascendingOrder } from '../numeric/ascendingOrder'

/**
 * Puts scans in the order of time; those of the same time keep the order they came in.
 *
 * @param minutes one a scan, finite
 * @returns `order`: which scan stands at each place; `place`: the place of each scan
 */
export function timeOrder(minutes: Float64Array): { order: Int32Array, place: Int32Array } {
  const order = ascendingOrder(minutes)
  const place = new Int32Array(order.length)
  order.forEach((scan, at) => {
    place[scan] = at
  })
  return { order, place }
}
