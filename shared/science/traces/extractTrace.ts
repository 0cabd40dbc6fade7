import { massToleranceDa } from '../mass/tolerance'
import { firstNotBelow } from '../numeric/firstPlace'
import type { Centroids } from './centroids'

/** The m/z between which a point belongs to an extracted trace, both ends within it. */
export interface MzWindow { lowMz: number, highMz: number }

/**
 * The window of an extracted trace: the between-table tolerance to both sides, max(ppm·10⁻⁶·m/z, floor).
 *
 * @param floorDa smallest tolerance in Da; null takes the floor that follows the ppm
 */
export function traceWindow(mz: number, ppm: number, floorDa: number | null = null): MzWindow {
  const half = massToleranceDa(mz, ppm, floorDa)
  return { lowMz: mz - half, highMz: mz + half }
}

/**
 * Extracted ion trace: for each scan the sum of intensities whose m/z lies within the window; 0 where none does.
 * One search, then the points of the window: a slice of a million points costs no more than the trace itself.
 *
 * @param centroids points ascending by m/z; not changed
 * @param window both ends count as within
 * @param scans scans of the trace, and so the length of the result
 * @returns counts a scan, in the order of time
 */
export function extractTrace({ mz, intensity, scan }: Centroids, { lowMz, highMz }: MzWindow, scans: number): Float64Array {
  const trace = new Float64Array(scans)
  for (let i = firstNotBelow(mz, lowMz); i < mz.length && mz[i]! <= highMz; i++) trace[scan[i]!]! += intensity[i]!
  return trace
}
