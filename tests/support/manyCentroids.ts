import { sliceOf, slicesBetween, type Centroids } from '../../shared/science/traces/centroids'
import type { AlignedScans } from '../../shared/science/traces/highestSignals'
import { ascendingOrder } from '../../shared/science/numeric/ascendingOrder'
import { seededRandom } from './seededRandom'

/** Cuts centroids into slices of 10 m/z and reads them as a trace's files are read. */
export function slicedTrace(all: Centroids, rest: Omit<AlignedScans, 'centroidsBetween' | 'lowestMz' | 'highestMz' | 'intensityLimit'> & Partial<AlignedScans>): AlignedScans {
  const slices = new Map<number, Centroids>()
  for (let start = 0; start < all.mz.length;) {
    const slice = sliceOf(all.mz[start]!)
    let end = start
    while (end < all.mz.length && sliceOf(all.mz[end]!) === slice) end++
    slices.set(slice, { mz: all.mz.subarray(start, end), intensity: all.intensity.subarray(start, end), scan: all.scan.subarray(start, end) })
    start = end
  }
  return {
    lowestMz: all.mz[0] ?? Number.NaN,
    highestMz: all.mz.at(-1) ?? Number.NaN,
    intensityLimit: 0,
    centroidsBetween: (low, high) => slicesBetween(low, high).flatMap(slice => slices.get(slice) ?? []),
    ...rest,
  }
}

/** Centroids at random m/z and scans, crowded so that windows hold several of one scan; in ascending m/z. */
export function manyCentroids(count: number, { scans = 200, lowestMz = 100, highestMz = 130, seed = 3 } = {}): Centroids {
  const { uniform, whole } = seededRandom(seed)
  const mz = Float64Array.from({ length: count }, () => lowestMz + (highestMz - lowestMz) * uniform())
  const order = ascendingOrder(mz)
  return {
    mz: Float64Array.from(order, i => mz[i]!),
    intensity: Float64Array.from({ length: count }, () => 10 + 1000 * uniform()),
    scan: Int32Array.from({ length: count }, () => whole(scans)),
  }
}
