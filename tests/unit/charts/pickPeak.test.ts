import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { pickPeak } from '../../../app/charts/pickPeak'

const minutes = Float64Array.of(5, 1, 5.02, 9)
const level = Float64Array.of(100, 50, 900, Number.NaN)
const byTime = Int32Array.of(1, 0, 2, 3)

describe('picking a peak', () => {
  it('takes the one that stands highest on that half within reach', () => {
    expect(pickPeak({ minutes, level, byTime }, 5, 0.05)).toBe(2)
    expect(pickPeak({ minutes, level, byTime }, 5, 0.01)).toBe(0)
  })

  it('takes the nearest where none stands on that half', () => {
    const none = new Float64Array(4).fill(Number.NaN)
    expect(pickPeak({ minutes, level: none, byTime }, 5.015, 0.05)).toBe(2)
    expect(pickPeak({ minutes, level: none, byTime }, 5.005, 0.05)).toBe(0)
    expect(pickPeak({ minutes, level, byTime }, 9.01, 0.05)).toBe(3)
  })

  it('takes none where no top is within reach', () => {
    expect(pickPeak({ minutes, level, byTime }, 7, 0.5)).toBeNull()
    expect(pickPeak({ minutes, level, byTime: new Int32Array(0) }, 5, 10)).toBeNull()
  })

  it('takes only those offered', () => {
    expect(pickPeak({ minutes, level, byTime: Int32Array.of(0) }, 5, 0.05)).toBe(0)
  })

  it('agrees with a look at every feature', () => {
    const features = fc.array(fc.tuple(fc.integer({ min: 0, max: 100 }), fc.oneof(fc.integer({ min: 1, max: 9 }), fc.constant(Number.NaN))), { maxLength: 40 })
    fc.assert(fc.property(features, fc.integer({ min: 0, max: 100 }), fc.integer({ min: 0, max: 10 }), (all, clicked, reach) => {
      const times = Float64Array.from(all, ([time]) => time)
      const levels = Float64Array.from(all, ([, height]) => height)
      const order = Int32Array.from([...all.keys()].sort((a, b) => (times[a] ?? 0) - (times[b] ?? 0)))
      const picked = pickPeak({ minutes: times, level: levels, byTime: order }, clicked, reach)
      const near = all.filter(([time]) => Math.abs(time - clicked) <= reach)
      const highest = Math.max(0, ...near.map(([, height]) => Number.isNaN(height) ? 0 : height))
      const nearest = Math.min(...near.filter(([, height]) => (Number.isNaN(height) ? 0 : height) === highest).map(([time]) => Math.abs(time - clicked)))
      if (near.length === 0) {
        expect(picked).toBeNull()
        return
      }
      const found = all[picked ?? -1]
      expect(found && (Number.isNaN(found[1]) ? 0 : found[1])).toBe(highest)
      expect(Math.abs((found?.[0] ?? 0) - clicked)).toBe(nearest)
    }))
  })
})
