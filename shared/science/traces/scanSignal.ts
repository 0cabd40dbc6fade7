import { MOST_COUNTS } from '../numeric/measurable'
import { HIGHEST_MZ } from './centroids'

/** Total and base peak of one scan in counts, and the points that are no measurement. */
export interface ScanSignal { total: number, base: number, odd: number }

/** Is this a point of a spectrum: an m/z in (0, 10⁵) and an intensity from 0 to below 10³⁰? */
export const isPoint = (mz: number, intensity: number): boolean => mz > 0 && mz < HIGHEST_MZ && intensity >= 0 && intensity < MOST_COUNTS

/**
 * Total signal (sum) and base peak (maximum) of one scan, from its points and not from what the file declares; both 0 for an empty scan.
 * Points that are no measurement (isPoint) count for neither and are told in `odd`.
 *
 * @param mz m/z of each point
 * @param intensity counts of each point, of the same length
 */
export function scanSignal(mz: Float64Array, intensity: Float64Array): ScanSignal {
  let total = 0
  let base = 0
  let odd = 0
  for (let i = 0; i < mz.length; i++) {
    const value = intensity[i]!
    if (!isPoint(mz[i]!, value)) {
      odd++
      continue
    }
    total += value
    if (value > base) base = value
  }
  return { total, base, odd }
}
