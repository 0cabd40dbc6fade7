import fc from 'fast-check'
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { guardFormula, stripFormulaGuard } from '../../../../shared/formats/delimitedText/formulaGuard'
import { csvCell, writeCsv } from '../../../../shared/formats/delimitedText/writeCsv'

describe('a CSV cell', () => {
  it.each([
    ['=1+1', '\'=1+1'], ['+49 30', '\'+49 30'], ['-', '\'-'], ['@name', '\'@name'], ['\'=1', '\'\'=1'],
    ['plain', 'plain'], ['a,b', '"a,b"'], ['say "x"', '"say ""x"""'], ['two\nlines', '"two\nlines"'], [' edge', '" edge"'],
    ['=a,b', '"\'=a,b"'], ['', ''], ['don\'t', 'don\'t'],
  ])('writes %j as %j', (value, expected) => expect(csvCell(value)).toBe(expected))

  it('guards a leading tab and carriage return', () => {
    expect(csvCell('\t=1')).toBe('\'\t=1')
    expect(csvCell('\r=1')).toBe('"\'\r=1"')
  })

  it('never guards a number, and leaves what is not one empty', () => {
    expect([-1.5, 0, 1e-20, Number.NaN, Infinity].map(csvCell)).toEqual(['-1.5', '0', '1e-20', '', ''])
    expect([null, undefined, true].map(csvCell)).toEqual(['', '', 'true'])
  })
})

describe('a CSV document', () => {
  it('starts with a byte order mark, then notes, header and rows', () => {
    expect(writeCsv(['m/z', 'name'], [[100.5, 'a'], [null, '=b']], ['engine 1,\nalpha 0.05'])).toBe(
      '\uFEFF"# engine 1, alpha 0.05"\r\nm/z,name\r\n100.5,a\r\n,\'=b\r\n')
  })

  it('gives every text back after reading and stripping', () => {
    fc.assert(fc.property(fc.array(fc.array(fc.string({ unit: fc.constantFrom('=', '+', '-', '@', '\t', '\'', '"', ',', '\n', 'a', ' ') }), { minLength: 2, maxLength: 2 }), { minLength: 1 }), (rows) => {
      const read = Papa.parse<string[]>(writeCsv(['one', 'two'], rows).slice(1), { delimiter: ',', newline: '\r\n' })
      expect(read.data.slice(1, 1 + rows.length).map(row => row.map(stripFormulaGuard))).toEqual(rows)
    }))
  })

  it('guards and strips as inverses', () => {
    fc.assert(fc.property(fc.string(), (text) => {
      expect(stripFormulaGuard(guardFormula(text))).toBe(text)
      expect(guardFormula(text)).not.toMatch(/^[=+\-@\t\r]/)
    }))
  })
})
