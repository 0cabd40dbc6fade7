import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { around, movedBy, pixelAt, plotFrame, timeAt, withinRun, zoomedBy } from '../../../app/charts/chromatogramWindow'

const run = [0, 20] as const
const part = fc.tuple(fc.double({ min: -5, max: 25, noNaN: true }), fc.double({ min: 0, max: 30, noNaN: true })).map(([from, span]): [number, number] => [from, from + span])

describe('the part of the run that is shown', () => {
  it('lies within the run and is wide enough to draw, whatever is asked', () => {
    fc.assert(fc.property(part, fc.double({ min: -3, max: 3, noNaN: true }), (asked, share) => {
      for (const [from, to] of [withinRun(asked, run), movedBy(asked, run, share), around(asked[0], run)]) {
        expect(from).toBeGreaterThanOrEqual(0)
        expect(to).toBeLessThanOrEqual(20)
        expect(to - from).toBeGreaterThan(0.049)
      }
    }))
  })

  it('keeps what lies within', () => {
    expect(withinRun([4.2, 5.6], run)).toEqual([4.2, 5.6])
  })

  it('zooms around its middle, and out to the whole run', () => {
    expect(zoomedBy([8, 12], run, 0.5)).toEqual([9, 11])
    expect(zoomedBy([8, 12], run, 2)).toEqual([6, 14])
    expect(zoomedBy([0, 4], run, 2)).toEqual([0, 8])
    expect(zoomedBy([2, 14], run, 2)).toBeNull()
  })

  it('moves no further than the run, at the same width', () => {
    expect(movedBy([4, 6], run, 0.5)).toEqual([5, 7])
    expect(movedBy([18, 20], run, 0.5)).toEqual([18, 20])
    expect(movedBy([0, 2], run, -0.5)).toEqual([0, 2])
  })

  it('stands half a minute to each side of a feature', () => {
    expect(around(5, run)).toEqual([4.5, 5.5])
    expect(around(0.2, run)).toEqual([0, 1])
  })

  it('turns pixels into minutes and back', () => {
    const frame = plotFrame(false)
    fc.assert(fc.property(fc.double({ min: 4, max: 6, noNaN: true }), (minutes) => {
      expect(timeAt(pixelAt(minutes, 800, frame, [4, 6]), 800, frame, [4, 6])).toBeCloseTo(minutes, 9)
    }))
    expect(timeAt(0, 800, frame, [4, 6])).toBe(4)
    expect(timeAt(2000, 800, frame, [4, 6])).toBe(6)
  })

  it('takes a run that is a single point', () => {
    expect(withinRun([3, 3], [3, 3])).toEqual([3, 3.05])
  })
})
