/** Points of many scans, ascending by m/z. `scan` is each point's place among the scans of the trace, which stand in the order of time. */
export interface Centroids { mz: Float64Array, intensity: Float64Array, scan: Int32Array }

/** Da of m/z in one slice: what is kept together, so that an extracted trace reads one slice, at a border two. */
export const SLICE_DA = 10

/** Above this an m/z is none. */
export const HIGHEST_MZ = 100_000

/** The slice that an m/z stands in. */
export const sliceOf = (mz: number): number => Math.floor(mz / SLICE_DA)

/** The slices that a window of m/z touches, ascending; none where the window is empty. */
export function slicesBetween(lowMz: number, highMz: number): number[] {
  const first = sliceOf(Math.max(0, lowMz))
  const last = sliceOf(Math.min(HIGHEST_MZ, highMz))
  return last < first ? [] : Array.from({ length: last - first + 1 }, (_, offset) => first + offset)
}
