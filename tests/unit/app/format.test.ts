import { describe, expect, it } from 'vitest'
import { formatCount, formatGain, formatIntensity, formatMinutes, formatMz, formatPpm, formatShare } from '../../../app/utils/formatMeasures'
import { formatFold, formatLog2, formatProbability, formatTimes } from '../../../app/utils/formatStatistics'

describe('formats of measures', () => {
  it('keeps the decimals a measure deserves', () => {
    expect(formatMz(313.07182)).toBe('313.0718')
    expect(formatMinutes(4.6)).toBe('4.60')
    expect(formatPpm(-1.26)).toBe('−1.3')
  })

  it.each([[934, '934'], [999.9, '1.00 × 10³'], [123_900, '1.24 × 10⁵'], [1e10, '1.00 × 10¹⁰'], [0.5, '0.500'], [0.00012, '1.20 × 10⁻⁴'], [0, '0']])('writes intensity %d as %s', (value, text) => {
    expect(formatIntensity(value)).toBe(text)
  })

  it('never prints what is no number', () => {
    for (const format of [formatMz, formatMinutes, formatPpm, formatIntensity, formatTimes, formatLog2, formatProbability]) {
      expect(format(Number.NaN)).toBe('–')
      expect(format(Number.POSITIVE_INFINITY)).toBe('–')
    }
  })
})

describe('formats of counts', () => {
  it('group thousands', () => {
    expect(formatCount(50_000)).toBe('50\u202F000')
    expect(formatCount(999)).toBe('999')
  })

  it('give a gain its sign', () => {
    expect([12, -3400, 0].map(formatGain)).toEqual(['+12', '−3\u202F400', '0'])
  })

  it('say none only where there is none', () => {
    expect([[1, 0], [0, 9], [1, 10_000], [44, 1000], [1, 2]].map(([part, whole]) => formatShare(part ?? 0, whole ?? 0))).toEqual(['none', '0 %', '0.1 %', '4.4 %', '50 %'])
  })
})

describe('formats of statistics', () => {
  it.each([[0, '< 1e-15'], [9.9e-16, '< 1e-15'], [3.24e-7, '3.2e-7'], [0.0123, '0.012'], [0.06, '0.060'], [0.5, '0.50'], [1, '1.0']])('writes probability %d as %s', (p, text) => {
    expect(formatProbability(p)).toBe(text)
  })

  it('writes ratios and their log2', () => {
    expect(formatTimes(3.2049)).toBe('×3.2')
    expect(formatTimes(31.26)).toBe('×31.3')
    expect(formatTimes(12_345)).toBe('×12300')
    expect(formatLog2(-1.678)).toBe('−1.68')
  })

  it('names the side that holds more', () => {
    const names = { a: 'Millrace', b: 'Tallow Lane' }
    expect(formatFold(2, names)).toBe('×4 in Tallow Lane')
    expect(formatFold(-1, names)).toBe('×2 in Millrace')
    expect(formatFold(0.001, names)).toBe('equal')
  })
})
