import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { DecimalMark, ThousandsMark } from '../../../../shared/science/table/layout'
import { parseNumber } from '../../../../shared/science/table/parseNumber'

describe('a number', () => {
  it.each<[string, DecimalMark, ThousandsMark, number]>([
    ['12.5', '.', '', 12.5], ['12,5', ',', '', 12.5], [' 7 ', '.', '', 7], ['.5', '.', '', 0.5], ['5.', '.', '', 5], ['+3', '.', '', 3], ['-3', '.', '', -3], ['−3,5', ',', '', -3.5],
    ['1,234.5', '.', ',', 1234.5], ['1.234,5', ',', '.', 1234.5], ['1 234 567', '.', ' ', 1_234_567], ['1\u00A0234,5', ',', ' ', 1234.5], ['1\u202F234', '.', ' ', 1234],
    ['1\'234.5', '.', '\'', 1234.5], ['1’234’567', '.', '\'', 1_234_567], ['1,2E+05', ',', '', 1.2e5], ['1.2e-5', '.', '', 1.2e-5], ['1,234e2', '.', ',', 123_400], ['1e400', '.', '', Infinity],
  ])('%j with %j and %j is %d', (text, decimal, thousands, value) => expect(parseNumber(text, decimal, thousands)).toBe(value))

  it.each<[string, DecimalMark, ThousandsMark]>([
    ['', '.', ''], ['.', '.', ''], ['-', '.', ''], ['Inf', '.', ''], ['Infinity', '.', ''], ['NaN', '.', ''], ['0x1F', '.', ''], ['12 mg', '.', ' '], ['1e', '.', ''], ['e5', '.', ''], ['1e5.5', '.', ''], ['--5', '.', ''], ['5-3', '.', ''],
    ['12,5', '.', ''], ['12.5', ',', ''], ['12,5', '.', ','], ['1234,567', '.', ','], ['1,23,456', '.', ','], [',123', '.', ','], ['1,,234', '.', ','], ['1.2.3', '.', ''], ['1,234,', '.', ','], ['1.234,567', '.', ','], ['1_000', '.', ''],
  ])('%j with %j and %j is none', (text, decimal, thousands) => expect(parseNumber(text, decimal, thousands)).toBeNaN())

  it('reads back every double that the language writes', () => {
    fc.assert(fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
      expect(parseNumber(String(value), '.', '')).toBe(value === 0 ? Number(String(value)) : value)
      expect(parseNumber(String(value).replace('.', ','), ',', '')).toBe(value === 0 ? Number(String(value)) : value)
    }))
  })

  it('reads back numbers with thousands in English, German and Swiss writing', () => {
    fc.assert(fc.property(fc.integer({ min: -1e12, max: 1e12 }), (whole) => {
      const value = whole / 100
      expect(parseNumber(value.toLocaleString('en-GB'), '.', ',')).toBe(value)
      expect(parseNumber(value.toLocaleString('de-DE'), ',', '.')).toBe(value)
      expect(parseNumber(value.toLocaleString('de-CH'), '.', '\'')).toBe(value)
    }))
  })
})
