import { massToleranceDa } from '../mass/tolerance'
import { ascendingOrder } from '../numeric/ascendingOrder'
import { firstAbove, firstNotBelow } from '../numeric/firstPlace'
import type { Centroids } from './centroids'
import { timeOrder } from './timeOrder'

/** One sample's trace as an alignment sees it. */
export interface AlignedScans {
  /** Minutes a scan, corrected to the alignment's common time; not always ascending. */
  scanMinutes: Float64Array
  /** Offset of its masses, ppm: a feature at m/z stands in the file at m/z × (1 + offsetPpm·10⁻⁶). 0 where none is taken out. */
  offsetPpm: number
  /** Lowest and highest m/z of its centroids, as the file has them. */
  lowestMz: number
  highestMz: number
  /** Centroids below this intensity were not kept; 0: all were. */
  intensityLimit: number
  /** Pieces that together hold each centroid of the range once; they may hold others too. Asked for in ascending m/z. */
  centroidsBetween: (lowestMz: number, highestMz: number) => readonly Centroids[]
}

/** How far from a feature's m/z and time a signal may stand: the tolerances of the alignment. */
export interface SignalWindow {
  alignMassPpm: number
  /** Smallest mass tolerance, Da; null: follows the ppm. */
  massFloorDa: number | null
  retentionMinutes: number
}

const FEATURES_A_STEP = 1000

/**
 * The highest extracted signal of each aligned feature in one trace: per scan the sum of the centroids within the mass tolerance,
 * and of the scans within the time tolerance the highest sum. Counts.
 *
 * 0 where nothing stands there; NaN where the trace does not cover the feature: its mass window lies beyond all centroids, its time
 * outside the first and last scan, or no scan within the time tolerance; or where nothing of it was kept and centroids below a limit
 * were not, so that what stands there is not known. A mass offset shifts the window instead of the centroids.
 *
 * @param mz m/z of the aligned features, in any order
 * @param minutes their times, common time
 * @param onStep told the share of features that is done, now and then
 */
export function highestSignals(mz: Float64Array, minutes: Float64Array, trace: AlignedScans, window: SignalWindow, onStep?: (share: number) => void): Float64Array {
  const { order, place } = timeOrder(trace.scanMinutes)
  const scanMinutes = Float64Array.from(order, scan => trace.scanMinutes[scan]!)
  const sum = new Float64Array(order.length)
  const shift = 1 + trace.offsetPpm * 1e-6
  const highest = new Float64Array(mz.length).fill(Number.NaN)
  ascendingOrder(mz).forEach((i, step) => {
    if (step % FEATURES_A_STEP === 0) onStep?.(step / mz.length)
    const tolerance = massToleranceDa(mz[i]!, window.alignMassPpm, window.massFloorDa)
    const low = (mz[i]! - tolerance) * shift
    const high = (mz[i]! + tolerance) * shift
    if (high < trace.lowestMz || low > trace.highestMz) return
    const first = firstNotBelow(scanMinutes, minutes[i]! - window.retentionMinutes)
    const end = firstAbove(scanMinutes, minutes[i]! + window.retentionMinutes)
    if (first >= end || !(minutes[i]! >= scanMinutes[0]!) || !(minutes[i]! <= scanMinutes.at(-1)!)) return
    for (const piece of trace.centroidsBetween(low, high)) addCentroids(piece, low, high, place, first, end, sum)
    let most = 0
    for (let s = first; s < end; s++) {
      if (sum[s]! > most) most = sum[s]!
      sum[s] = 0
    }
    highest[i] = most === 0 && trace.intensityLimit > 0 ? Number.NaN : most
  })
  return highest
}

/** Adds the centroids between two m/z to the sums of their scans, for scans whose place in time is `first` up to `end`. */
function addCentroids({ mz, intensity, scan }: Centroids, low: number, high: number, place: Int32Array, first: number, end: number, sum: Float64Array): void {
  for (let c = firstNotBelow(mz, low); c < mz.length && mz[c]! <= high; c++) {
    const at = place[scan[c]!]!
    if (at >= first && at < end) sum[at]! += intensity[c]!
  }
}
