import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { meanTrace } from '../../../shared/science/traces/meanTrace'

const line = (points: readonly (readonly [number, number])[]) => ({ minutes: Float64Array.from(points, ([time]) => time), values: Float64Array.from(points, ([, value]) => value) })
const anyTrace = fc.uniqueArray(fc.tuple(fc.integer({ min: 0, max: 500 }), fc.integer({ min: 0, max: 1_000_000 })), { selector: ([time]) => time, minLength: 2, maxLength: 60 })
  .map(points => line(points.sort((one, other) => one[0] - other[0])))

describe('the mean of traces', () => {
  it('interpolates each between its scans', () => {
    const mean = meanTrace([line([[0, 0], [2, 10]]), line([[0, 4], [1, 8], [2, 4]])])
    expect([...mean.minutes]).toEqual([0, 1, 2])
    expect([...mean.values]).toEqual([2, 6.5, 7])
  })

  it('counts a trace only where it was measured', () => {
    const mean = meanTrace([line([[0, 6], [3, 6]]), line([[1, 2], [2, 2]])])
    expect([...mean.values]).toEqual([6, 4, 4, 6])
  })

  it('leaves out what is no number, and says so where nothing counts', () => {
    const mean = meanTrace([line([[0, 6], [1, Number.NaN]]), line([[0, 2], [1, 4]])])
    expect([...mean.values]).toEqual([4, 4])
    expect([...meanTrace([line([[0, 1], [1, 1]]), line([[5, 2], [6, 2]])]).values]).toEqual([1, 1, 2, 2])
    expect([...meanTrace([line([[0, Number.NaN]]), line([[0, Number.NaN]])]).values]).toEqual([Number.NaN])
  })

  it('has a point at every scan of every trace, so at every top', () => {
    fc.assert(fc.property(fc.array(anyTrace, { minLength: 1, maxLength: 5 }), (traces) => {
      const { minutes } = meanTrace(traces)
      const times = new Set(minutes)
      for (const trace of traces) for (const time of trace.minutes) expect(times).toContain(time)
      for (let i = 1; i < minutes.length; i++) expect(minutes[i]).toBeGreaterThan(minutes[i - 1] ?? -1)
    }))
  })

  it('does not depend on the order of the traces, and of equal ones is that one', () => {
    fc.assert(fc.property(fc.array(anyTrace, { minLength: 2, maxLength: 4 }), (traces) => {
      const there = meanTrace(traces)
      const back = meanTrace([...traces].reverse())
      there.values.forEach((value, i) => expect(value).toBeCloseTo(back.values[i] ?? Number.NaN, 6))
    }))
    fc.assert(fc.property(anyTrace, (trace) => {
      const mean = meanTrace([trace, trace, trace])
      mean.values.forEach((value, i) => expect(value).toBeCloseTo(trace.values[i] ?? Number.NaN, 6))
    }))
  })

  it('is empty without traces, and a copy of a single one', () => {
    expect(meanTrace([]).minutes).toHaveLength(0)
    const one = line([[0, 1], [1, 2]])
    const mean = meanTrace([one])
    expect([...mean.values]).toEqual([1, 2])
    expect(mean.values).not.toBe(one.values)
  })
})
