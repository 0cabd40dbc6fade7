import { describe, expect, it } from 'vitest'
import { slicesBetween, type Centroids } from '../../../shared/science/traces/centroids'
import { extractTrace, traceWindow } from '../../../shared/science/traces/extractTrace'
import { sortCentroids } from '../../../shared/science/traces/sortCentroids'
import { seededRandom } from '../../support/seededRandom'

const scans = 50
function manyCentroids(points: number, seed: number): Centroids {
  const random = seededRandom(seed).uniform
  const mz = Float64Array.from({ length: points }, () => 100 + random() * 0.1)
  const natural = Int32Array.from({ length: scans }, (_, i) => i)
  return sortCentroids({ mz, intensity: mz.map(() => random() * 1000), scan: Int32Array.from(mz, () => Math.floor(random() * scans)) }, natural)
}

describe('extractTrace', () => {
  it('is the sum of what lies within the window, as looking at every point gives it', () => {
    const centroids = manyCentroids(5000, 3)
    for (const [mz, ppm] of [[100.05, 10], [100, 10], [100.1, 50], [99, 10]] as const) {
      const window = traceWindow(mz, ppm)
      const expected = new Float64Array(scans)
      centroids.mz.forEach((value, i) => {
        if (value >= window.lowMz && value <= window.highMz) expected[centroids.scan[i] ?? 0] = (expected[centroids.scan[i] ?? 0] ?? 0) + (centroids.intensity[i] ?? 0)
      })
      expect([...extractTrace(centroids, window, scans)]).toEqual([...expected])
    }
  })

  it('takes the floor of the tolerance at low m/z, and both ends as within', () => {
    expect(traceWindow(100, 10).highMz).toBeCloseTo(100.002, 12)
    expect(traceWindow(500, 10).highMz).toBeCloseTo(500.005, 12)
    const window = { lowMz: 1, highMz: 2 }
    const centroids = { mz: Float64Array.of(1, 2, 2.0000001), intensity: Float64Array.of(1, 2, 4), scan: Int32Array.of(0, 0, 0) }
    expect([...extractTrace(centroids, window, 2)]).toEqual([3, 0])
  })

  it('is flat where there is nothing', () => {
    const none = { mz: new Float64Array(0), intensity: new Float64Array(0), scan: new Int32Array(0) }
    expect([...extractTrace(none, traceWindow(100, 10), 3)]).toEqual([0, 0, 0])
    expect(extractTrace(none, traceWindow(100, 10), 0)).toHaveLength(0)
  })
})

describe('slicesBetween', () => {
  it('is one slice, two at a border, and none of an empty window', () => {
    expect(slicesBetween(151, 152)).toEqual([15])
    expect(slicesBetween(159.999, 160.001)).toEqual([15, 16])
    expect(slicesBetween(152, 151)).toEqual([15])
    expect(slicesBetween(200, 100)).toEqual([])
    expect(slicesBetween(-5, 3)).toEqual([0])
  })
})
