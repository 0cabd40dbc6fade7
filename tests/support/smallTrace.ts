import { mzmlText, writtenScan } from './mzmlText'

/** A peak of a small trace: its m/z, the minutes of its top, and its height in counts. */
export type SmallPeak = readonly [mz: number, minutes: number, height: number]

const STEP_MINUTES = 0.05
const WIDTH_MINUTES = 0.05

/** An mzML file from 0.5 to 4.5 minutes, a scan every 0.05, with Gaussian peaks and one faint point at m/z 150 and 250 in every scan. */
export function smallTrace(peaks: readonly SmallPeak[]): string {
  return mzmlText(Array.from({ length: 81 }, (_, scan) => {
    const minutes = Number((0.5 + scan * STEP_MINUTES).toFixed(2))
    const points = [[150, 1], ...peaks.map(([mz, top, height]) => [mz, height * Math.exp(-((minutes - top) ** 2) / (2 * WIDTH_MINUTES ** 2))]), [250, 1]]
    const kept = points.filter(([, intensity = 0]) => intensity >= 0.5).sort(([one = 0], [other = 0]) => one - other)
    return writtenScan({ minutes, mz: kept.map(([mz = 0]) => mz), intensity: kept.map(([, intensity = 0]) => intensity) })
  }))
}
