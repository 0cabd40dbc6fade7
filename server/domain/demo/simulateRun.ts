import type { WrittenScan } from '../../../shared/formats/mzml/writeMzml'
import { wholeRunIons } from './background'
import type { SeededRandom } from './seededRandom'
import { DEMO_RUN_MINUTES, type DemoSignal } from './simulateTable'

export const DEMO_SCAN_MINUTES = 0.03
export const DEMO_SCANS = DEMO_RUN_MINUTES / DEMO_SCAN_MINUTES
/** Standard deviation of a peak at the start of the run, and how it widens. */
const PEAK_MINUTES = 0.03
const WIDENING = 0.001
/** Of a hump that no peak picker takes. */
export const HUMP_MINUTES = 0.15
const REACH_IN_DEVIATIONS = 3.2
const MASS_SCATTER_PPM = 0.8
const SCAN_NOISE = 0.04
/** Counts below which the detector writes no point. */
const DETECTOR_LIMIT = 60
const BLEED = 700
const NOISE_POINTS = 8
const NOISE = 70
const MOST_NOISE = 300

/**
 * The raw data of one injection as centroided scans: each signal a Gaussian with its apex at the intensity that the table gives,
 * ions that bleed over the whole run, and noise well below what is picked.
 *
 * @param humps signals that are too broad to be picked
 */
export function simulateRun(signals: readonly DemoSignal[], humps: readonly DemoSignal[], polarity: 'negative' | 'positive', random: SeededRandom): WrittenScan[] {
  const points: [mz: number, intensity: number][][] = Array.from({ length: DEMO_SCANS }, () => [])
  const add = (scan: number, mz: number, intensity: number) => {
    const value = intensity * (1 + random.normal(0, SCAN_NOISE))
    if (value >= DETECTOR_LIMIT) points[scan]?.push([mz * (1 + random.normal(0, MASS_SCATTER_PPM) * 1e-6), value])
  }
  const addPeak = ({ mz, minutes, intensity }: DemoSignal, deviation: number) => {
    const first = Math.max(0, Math.ceil((minutes - REACH_IN_DEVIATIONS * deviation) / DEMO_SCAN_MINUTES))
    const last = Math.min(DEMO_SCANS - 1, Math.floor((minutes + REACH_IN_DEVIATIONS * deviation) / DEMO_SCAN_MINUTES))
    for (let scan = first; scan <= last; scan++) add(scan, mz, intensity * Math.exp(-(((scan * DEMO_SCAN_MINUTES - minutes) / deviation) ** 2) / 2))
  }
  for (const signal of signals) addPeak(signal, PEAK_MINUTES + WIDENING * signal.minutes)
  for (const hump of humps) addPeak(hump, HUMP_MINUTES)
  for (let scan = 0; scan < DEMO_SCANS; scan++) {
    for (const mz of wholeRunIons[polarity]) add(scan, mz, BLEED * random.factor(20))
    for (let i = 0; i < NOISE_POINTS; i++) add(scan, random.between(100, 900), Math.min(MOST_NOISE, -NOISE * Math.log(1 - random.between(0, 1)) + DETECTOR_LIMIT))
  }
  return points.map((scan, index) => {
    scan.sort((a, b) => a[0] - b[0])
    return { level: 1, polarity, minutes: Number((index * DEMO_SCAN_MINUTES).toFixed(2)), mz: Float64Array.from(scan, point => point[0]), intensity: Float64Array.from(scan, point => point[1]) }
  })
}
