import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { assumedLevel, assumedMoreLimit, assumedStandardError, chanceOfMore, log2Sigma } from '../../../shared/science/statistics/assumedPrecision'
import { falseDiscovery } from '../../../shared/science/statistics/falseDiscovery'
import { meanAndVariance } from '../../../shared/science/statistics/meanAndVariance'
import { studentQuantile, studentQuantileOf } from '../../../shared/science/statistics/studentQuantile'
import { studentTwoSided, studentUpperTail } from '../../../shared/science/statistics/studentTail'
import { welch } from '../../../shared/science/statistics/welch'

describe('meanAndVariance', () => {
  it('skips what is missing', () => {
    expect(meanAndVariance([2, Number.NaN, 4])).toEqual({ n: 2, mean: 3, variance: 2 })
    expect(meanAndVariance([5])).toEqual({ n: 1, mean: 5, variance: Number.NaN })
    expect(meanAndVariance([])).toEqual({ n: 0, mean: Number.NaN, variance: Number.NaN })
  })
})

describe('Student tails', () => {
  it('never become 0 or 1 − 1 far out', () => {
    expect(studentTwoSided(300, 8)).toBeGreaterThan(0)
    expect(studentTwoSided(300, 8)).toBeLessThan(1e-15)
    expect(studentUpperTail(-300, 8)).toBe(1)
    expect(studentTwoSided(0, 3)).toBe(1)
  })
})

describe('welch', () => {
  it('says nothing below two values a side or without any spread', () => {
    expect(welch(meanAndVariance([1]), meanAndVariance([2, 3])).p).toBeNaN()
    expect(welch(meanAndVariance([1, 1]), meanAndVariance([2, 2 + 1e-7])).p).toBeNaN()
  })

  it('uses the other side alone where one has no spread', () => {
    const result = welch(meanAndVariance([1, 1, 1]), meanAndVariance([2, 3]))
    expect(result.degreesOfFreedom).toBe(1)
    expect(result.standardError).toBe(0.5)
  })

  it('mirrors when the sides are swapped', () => {
    const values = fc.array(fc.double({ min: 0, max: 30, noNaN: true }), { minLength: 2, maxLength: 6 })
    fc.assert(fc.property(values, values, (a, b) => {
      const there = welch(meanAndVariance(a), meanAndVariance(b))
      const back = welch(meanAndVariance(b), meanAndVariance(a))
      expect(back.difference + 0).toBe(-there.difference + 0)
      expect(back.p).toEqual(there.p)
      expect(back.degreesOfFreedom).toEqual(there.degreesOfFreedom)
    }))
  })
})

describe('falseDiscovery', () => {
  it('handles none, one, equal and all missing', () => {
    expect([...falseDiscovery([])]).toEqual([])
    expect([...falseDiscovery([0.2])]).toEqual([0.2])
    expect([...falseDiscovery([0.03, 0.03, 0.03])]).toEqual([0.03, 0.03, 0.03])
    expect([...falseDiscovery([Number.NaN, Number.NaN])]).toEqual([Number.NaN, Number.NaN])
  })

  it('is never below p, never above 1 and keeps the order', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: 0, max: 1, noNaN: true })), (p) => {
      const q = falseDiscovery(p)
      p.forEach((value, i) => {
        expect(q[i]).toBeGreaterThanOrEqual(value)
        expect(q[i]).toBeLessThanOrEqual(1)
        p.forEach((other, j) => { if (value < other) expect(q[i]).toBeLessThanOrEqual(q[j] ?? Number.NaN) })
      })
    }))
  })
})

describe('studentQuantileOf', () => {
  it('agrees with the exact quantile at any df', () => {
    const quick = studentQuantileOf(0.95)
    fc.assert(fc.property(fc.oneof(fc.double({ min: 0.5, max: 60, noNaN: true }), fc.double({ min: 60, max: 1e6, noNaN: true })), (df) => {
      const exact = studentQuantile(0.95, df)
      expect(Math.abs(quick(df) - exact) / exact).toBeLessThan(1e-10)
    }))
  })
})

describe('assumed precision', () => {
  it('gives the worked case of 20 % and one preparation a side', () => {
    expect(log2Sigma(20)).toBeCloseTo(0.285715, 6)
    const s = assumedStandardError(20, 1, 1)
    expect(s).toBeCloseTo(0.404061, 6)
    expect(assumedMoreLimit(1, s)).toBe(1)
    expect(assumedMoreLimit(0.5, s)).toBeCloseTo(0.791946, 5)
    expect(assumedLevel(0.33, 1, s)).toBe(true)
    expect(assumedLevel(-0.34, 1, s)).toBe(false)
    expect(chanceOfMore(1, s)).toBeCloseTo(0.01333, 4)
    expect(chanceOfMore(0.5, s)).toBeCloseTo(0.05, 9)
  })

  it('narrows with more preparations', () => {
    expect(assumedStandardError(20, 1, 3)).toBeLessThan(assumedStandardError(20, 1, 1))
  })
})
