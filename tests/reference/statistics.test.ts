// Reference: data/statistics.json, made by data/make-statistics.R with R 4.2.2 (base stats); each block there names its data's source.
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { equivalence, equivalenceP } from '../../shared/science/statistics/equivalence'
import { falseDiscovery } from '../../shared/science/statistics/falseDiscovery'
import { meanAndVariance } from '../../shared/science/statistics/meanAndVariance'
import { studentQuantile, studentQuantileOf } from '../../shared/science/statistics/studentQuantile'
import { welch } from '../../shared/science/statistics/welch'

interface Welch { t: number, df: number, p: number, low: number, high: number }
interface Reference {
  tTests: Record<string, { a: number[], b: number[], difference: number, welch: Welch }>
  falseDiscovery: { p: number[], bh: number[], unordered: { p: (number | null)[], bh: (number | null)[] } }
  equivalence: Record<string, { a: number[], b: number[], difference: number, margin: number, df: number, pLow: number, pHigh: number }>
}
const reference = JSON.parse(readFileSync(new URL('data/statistics.json', import.meta.url), 'utf8')) as Reference

const expectRelative = (actual: number, expected: number, what: string) => {
  expect(Math.abs(actual - expected) / Math.abs(expected), `${what}: ${actual} against ${expected}`).toBeLessThan(1e-9)
}
const missing = (values: (number | null)[]) => values.map(value => value ?? Number.NaN)

describe('Welch t', () => {
  const cases = Object.entries(reference.tTests)
  it('has the far tail among its cases', () => {
    expect(cases.map(([name]) => name)).toContain('farTail')
  })

  it.each(cases)('gives t, df, p and interval of %s', (_name, { a, b, difference, welch: expected }) => {
    const result = welch(meanAndVariance(a), meanAndVariance(b))
    expectRelative(result.difference, difference, 'difference')
    expectRelative(result.t, expected.t, 't')
    expectRelative(result.degreesOfFreedom, expected.df, 'df')
    expectRelative(result.p, expected.p, 'p')
    for (const quantile of [studentQuantile(0.95, result.degreesOfFreedom), studentQuantileOf(0.95)(result.degreesOfFreedom)]) {
      expectRelative(result.difference - quantile * result.standardError, expected.low, 'low')
      expectRelative(result.difference + quantile * result.standardError, expected.high, 'high')
    }
  })
})

describe('false discovery rate', () => {
  it('gives the published table', () => {
    const q = falseDiscovery(reference.falseDiscovery.p)
    reference.falseDiscovery.bh.forEach((expected, i) => expectRelative(q[i] ?? Number.NaN, expected, `rank ${i}`))
  })

  it('takes any order and leaves what was not tested', () => {
    const { p, bh } = reference.falseDiscovery.unordered
    const q = falseDiscovery(missing(p))
    missing(bh).forEach((expected, i) => {
      if (Number.isNaN(expected)) expect(q[i]).toBeNaN()
      else expectRelative(q[i] ?? Number.NaN, expected, `value ${i}`)
    })
  })
})

describe('equivalence', () => {
  it.each(Object.entries(reference.equivalence))('gives both one-sided p-values: %s', (_name, { a, b, margin, df, pLow, pHigh }) => {
    const test = welch(meanAndVariance(a), meanAndVariance(b))
    expectRelative(test.degreesOfFreedom, df, 'df')
    const result = equivalence(test.difference, test.standardError, test.degreesOfFreedom, margin)
    expectRelative(result.pLow, pLow, 'pLow')
    expectRelative(result.pHigh, pHigh, 'pHigh')
    expectRelative(result.p, Math.max(pLow, pHigh), 'p')
    expect(equivalenceP(test.difference, test.standardError, test.degreesOfFreedom, margin)).toBe(result.p)
  })
})
