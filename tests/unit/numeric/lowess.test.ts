import { describe, expect, it } from 'vitest'
import { lowess } from '../../../shared/science/numeric/lowess'
import statistics from '../../reference/data/statistics.json'

const { x, y, cases } = statistics.lowess

describe('lowess', () => {
  // Values: R's lowess with delta 0 on the stopping distances of Ezekiel 1930 (tests/reference/data/make-statistics.R).
  it.each(cases)('equals the published algorithm at span $f with $iterations iterations', ({ f, iterations, fit }) => {
    const curve = lowess(Float64Array.from(x), Float64Array.from(y), { span: f, iterations })
    curve.fit.forEach((value, i) => expect(Math.abs(value - (fit[i] ?? Number.NaN))).toBeLessThan(1e-6))
    expect(curve.fit.length).toBe(fit.length)
  })

  it('follows a straight line exactly, through few knots too', () => {
    const times = Float64Array.from({ length: 500 }, (_, i) => i / 25)
    const curve = lowess(times, times.map(t => 0.3 - 0.02 * t), { span: 0.3, iterations: 3, maxKnots: 40 })
    expect(curve.knotX.length).toBe(40)
    curve.fit.forEach((value, i) => expect(value).toBeCloseTo(0.3 - 0.02 * (times[i] ?? 0), 9))
  })

  it('stays close to the full curve with knots at quantiles only', () => {
    const times = Float64Array.from({ length: 800 }, (_, i) => i / 40)
    const shifts = times.map((t, i) => 0.2 * Math.sin(t / 3) + 0.01 * Math.sin(i * 12.9898))
    const full = lowess(times, shifts, { span: 0.3, iterations: 3 })
    const sparse = lowess(times, shifts, { span: 0.3, iterations: 3, maxKnots: 200 })
    full.fit.forEach((value, i) => expect(Math.abs(value - (sparse.fit[i] ?? Number.NaN))).toBeLessThan(1e-3))
  })

  it('is not drawn away by a few outliers', () => {
    const times = Float64Array.from({ length: 200 }, (_, i) => i / 10)
    const shifts = times.map((t, i) => i % 11 === 0 ? 5 : 0.01 * t + 0.001 * Math.sin(i))
    const { fit } = lowess(times, shifts, { span: 0.3, iterations: 3 })
    fit.forEach((value, i) => expect(Math.abs(value - 0.01 * (times[i] ?? 0))).toBeLessThan(0.01))
  })

  it('takes one point, and points at one time, for what they are', () => {
    expect(lowess(Float64Array.of(3), Float64Array.of(7), { span: 0.3, iterations: 3 }).fit).toEqual(Float64Array.of(7))
    const level = lowess(Float64Array.of(2, 2, 2, 2), Float64Array.of(1, 2, 3, 4), { span: 1, iterations: 0 })
    expect(level.knotX).toEqual(Float64Array.of(2))
    expect(level.fit).toEqual(Float64Array.of(2.5, 2.5, 2.5, 2.5))
  })
})
