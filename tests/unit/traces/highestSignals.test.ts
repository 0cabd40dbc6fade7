import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { massToleranceDa } from '../../../shared/science/mass/tolerance'
import { correctScans } from '../../../shared/science/traces/correctScans'
import type { Centroids } from '../../../shared/science/traces/centroids'
import { highestSignals, type AlignedScans, type SignalWindow } from '../../../shared/science/traces/highestSignals'
import { manyCentroids, slicedTrace } from '../../support/manyCentroids'
import { seededRandom } from '../../support/seededRandom'

const window: SignalWindow = { alignMassPpm: 10, massFloorDa: null, retentionMinutes: 0.1 }
const columns = (rows: readonly (readonly [mz: number, scan: number, intensity: number])[]): Centroids => ({
  mz: Float64Array.from(rows, ([mz]) => mz), scan: Int32Array.from(rows, ([, scan]) => scan), intensity: Float64Array.from(rows, ([,, intensity]) => intensity),
})
/** Scans every 0.05 min from 0 to 2. */
const scanMinutes = Float64Array.from({ length: 41 }, (_, scan) => scan * 0.05)
const one = (rows: Parameters<typeof columns>[0], mz: number, minutes: number, rest: Partial<AlignedScans> = {}, tolerances = window) =>
  highestSignals(Float64Array.of(mz), Float64Array.of(minutes), slicedTrace(columns(rows), { scanMinutes, offsetPpm: 0, lowestMz: 90, highestMz: 900, ...rest }), tolerances)[0]

/** The definition as it reads: every scan, every centroid. */
function slowly(mz: Float64Array, minutes: Float64Array, all: Centroids, trace: AlignedScans, tolerances: SignalWindow): number[] {
  const times = [...trace.scanMinutes]
  return [...mz].map((target, i) => {
    const time = minutes[i]!
    const tolerance = massToleranceDa(target, tolerances.alignMassPpm, tolerances.massFloorDa)
    const near = times.flatMap((scanTime, scan) => scanTime >= time - tolerances.retentionMinutes && scanTime <= time + tolerances.retentionMinutes ? [scan] : [])
    const factor = 1 + trace.offsetPpm * 1e-6
    const outside = (target + tolerance) * factor < trace.lowestMz || (target - tolerance) * factor > trace.highestMz
    if (outside || near.length === 0 || time < Math.min(...times) || time > Math.max(...times)) return Number.NaN
    const sums = near.map(scan => [...all.mz].reduce((sum, value, c) => sum + (all.scan[c] === scan && value >= (target - tolerance) * factor && value <= (target + tolerance) * factor ? all.intensity[c]! : 0), 0))
    return Math.max(...sums)
  })
}

describe('the highest signal in a trace', () => {
  it('sums the centroids of a scan, and takes the highest scan', () => {
    expect(one([[300, 20, 50], [300.001, 20, 30], [300.002, 21, 70]], 300.001, 1)).toBe(80)
  })

  it('takes what lies within the mass tolerance, or its floor at low m/z', () => {
    expect(one([[300.0029, 20, 50]], 300, 1)).toBe(50)
    expect(one([[300.0031, 20, 50]], 300, 1)).toBe(0)
    expect(one([[100.0019, 20, 50]], 100, 1)).toBe(50)
    expect(one([[100.0019, 20, 50]], 100, 1, {}, { ...window, massFloorDa: 0.001 })).toBe(0)
  })

  it('takes what lies within the time tolerance', () => {
    expect(one([[300, 21, 50]], 300, 0.96)).toBe(50)
    expect(one([[300, 21, 50]], 300, 0.94)).toBe(0)
  })

  it('sums over the edge of two slices', () => {
    expect(one([[309.9995, 20, 50], [310.0005, 20, 30]], 310, 1)).toBe(80)
  })

  it('shifts the window by the mass offset', () => {
    const rows = [[300 * (1 + 30e-6), 20, 50]] as const
    expect(one(rows, 300, 1)).toBe(0)
    expect(one(rows, 300, 1, { offsetPpm: 30 })).toBe(50)
    expect(one(rows, 300, 1, { offsetPpm: -30 })).toBe(0)
  })

  it('is 0 where nothing stands, and NaN where the trace does not cover the feature', () => {
    expect(one([], 300, 1)).toBe(0)
    expect(one([], 89.9, 1)).toBeNaN()
    expect(one([], 900.1, 1)).toBeNaN()
    expect(one([], 900.005, 1)).toBe(0)
    expect(one([[300, 40, 50]], 300, 2)).toBe(50)
    expect(one([[300, 40, 50]], 300, 2.05)).toBeNaN()
    expect(one([], 300, 1, { scanMinutes: Float64Array.of(0, 0.5, 0.8, 1.2, 2) })).toBeNaN()
    expect(one([], 300, 1, { scanMinutes: new Float64Array(0) })).toBeNaN()
    expect(one([], 300, 1, { intensityLimit: 20 })).toBeNaN()
    expect(one([[300, 20, 50]], 300, 1, { intensityLimit: 20 })).toBe(50)
  })

  it('follows corrected times, also where their order is no longer that of the scans', () => {
    const corrected = correctScans(Float64Array.of(0, 1, 2, 3), { knotMinutes: Float64Array.of(1, 2), knotShiftMinutes: Float64Array.of(-0.2, 0.95) })
    expect([...corrected].map(minutes => Number(minutes.toFixed(9)))).toEqual([0.2, 1.2, 1.05, 2.05])
    const trace = { scanMinutes: corrected }
    expect(one([[300, 1, 40], [300, 2, 50]], 300, 1.14, trace)).toBe(50)
    expect(one([[300, 1, 40], [300, 2, 50]], 300, 1.25, trace)).toBe(40)
  })

  it('equals the slow definition, whatever the order of the features', () => {
    const all = manyCentroids(3000, { scans: 30 })
    const { uniform } = seededRandom(9)
    fc.assert(fc.property(fc.double({ min: -20, max: 20, noNaN: true }), fc.integer({ min: 5, max: 60 }), fc.double({ min: 0.01, max: 0.5, noNaN: true }), (offsetPpm, alignMassPpm, retentionMinutes) => {
      const times = Float64Array.from({ length: 30 }, () => 3 * uniform())
      const trace = slicedTrace(all, { scanMinutes: times, offsetPpm })
      const mz = Float64Array.from({ length: 25 }, (_, i) => i % 5 === 0 ? 110 + 0.001 * uniform() : 99.99 + 30.02 * uniform())
      const minutes = Float64Array.from({ length: 25 }, () => -0.2 + 3.4 * uniform())
      const tolerances = { alignMassPpm, massFloorDa: null, retentionMinutes }
      expect([...highestSignals(mz, minutes, trace, tolerances)]).toEqual(slowly(mz, minutes, all, trace, tolerances))
    }), { numRuns: 30, seed: 1 })
  })

  it('tells how far it is, and leaves its input as it was', () => {
    const all = manyCentroids(500)
    const mz = Float64Array.from({ length: 2500 }, (_, i) => 130 - i * 0.01)
    const minutes = new Float64Array(2500).fill(1)
    const before = structuredClone({ all, mz, minutes })
    const steps: number[] = []
    highestSignals(mz, minutes, slicedTrace(all, { scanMinutes, offsetPpm: 0 }), window, share => steps.push(share))
    expect(steps).toEqual([0, 0.4, 0.8])
    expect({ all, mz, minutes }).toEqual(before)
  })
})
