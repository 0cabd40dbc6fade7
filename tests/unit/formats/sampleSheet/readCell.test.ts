import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cellText } from '../../../../shared/formats/sampleSheet/cellText'
import { readSheetCsv } from '../../../../shared/formats/sampleSheet/readBlock'
import { readCell, splitAmount } from '../../../../shared/formats/sampleSheet/readCell'
import { writeSheet } from '../../../../shared/formats/sampleSheet/writeSheet'
import { amountUnits, sampleFields, sampleKinds, sampleSchema, sides, type SampleField } from '../../../../shared/schemas/sample'

const names = { sideAName: 'Millrace', sideBName: 'Tallow Lane' }
const read = (field: SampleField, text: string) => {
  const result = readCell(field, text, names)
  return 'value' in result ? result.value : result
}

describe('a cell of the sheet', () => {
  it.each([
    ['kind', '', 'sample'], ['kind', 'blank', 'solventBlank'], ['kind', 'Process-Blank', 'processBlank'], ['kind', 'procedural blank', 'processBlank'], ['kind', 'QC', 'pooledQc'], ['kind', 'Pooled QC', 'pooledQc'], ['kind', 'std.', 'standard'],
    ['side', 'a', 'A'], ['side', 'Side B', 'B'], ['side', ' tallow lane ', 'B'], ['side', 'MILLRACE', 'A'], ['side', '', null], ['side', '-', null],
    ['amount', '12,5', 12.5], ['amount', '1e-3', 0.001], ['amount', '', null], ['volumeMl', '1.5 mL', 1.5], ['injectionUl', '2 µL', 2], ['injectionUl', '2ul', 2], ['runOrder', '12', 12],
    ['amountUnit', 'ML', 'mL'], ['amountUnit', '', 'mg'], ['name', '  x ', 'x'], ['batch', '7', '7'],
  ] as const)('%s %j is %j', (field, text, value) => expect(read(field, text)).toEqual(value))

  it.each([
    ['kind', 'water', 'Not a kind: sample, solvent blank, process blank, pooled QC or standard.'],
    ['side', 'C', 'Not a side: A (Millrace), B (Tallow Lane) or empty.'],
    ['amountUnit', 'g', 'Not a unit: mg or mL.'],
    ['amount', 'ten', 'Not a number. Use digits with a point or a comma.'], ['amount', '0', 'Must be greater than 0.'], ['amount', '-1', 'Must be greater than 0.'], ['volumeMl', '1 mg', 'Not a number. Use digits with a point or a comma.'],
    ['dilution', '1:10', 'Not a number. Give the factor: 10 for one part made up to ten.'],
    ['runOrder', '1,5', 'A whole number.'], ['runOrder', '-1', '0 or more.'],
    ['name', ' ', 'A sample needs a name.'], ['batch', 'x'.repeat(121), 'At most 120 characters.'],
  ] as const)('%s %j is refused', (field, text, sentence) => expect(read(field, text)).toEqual({ sentence }))

  it('takes an amount and its unit apart, and nothing else', () => {
    expect(splitAmount('12,5mg')).toEqual({ amount: '12,5', unit: 'mg' })
    expect(splitAmount('2 ML')).toEqual({ amount: '2', unit: 'mL' })
    expect([splitAmount('mg'), splitAmount('12'), splitAmount('1 g')]).toEqual([null, null, null])
  })
})

const text = fc.string({ unit: fc.constantFrom('a', 'B', ' ', ',', ';', '"', '\'', '=', '-', '+', '1', 'µ', '\t'), maxLength: 8 }).map(each => each.trim().replaceAll(/\s+/g, ' '))
const number = fc.double({ min: 1e-6, max: 1e6, noNaN: true })
const sample = fc.record({
  name: text.map(each => `n${each}`), kind: fc.constantFrom(...sampleKinds), side: fc.option(fc.constantFrom(...sides)), preparation: text,
  amount: fc.option(number), amountUnit: fc.constantFrom(...amountUnits), volumeMl: fc.option(number), dilution: fc.option(number), injectionUl: fc.option(number),
  runOrder: fc.option(fc.nat(100_000)), batch: text,
}).map(each => sampleSchema.parse(each))

describe('what is written', () => {
  it('is read back, cell by cell', () => {
    fc.assert(fc.property(sample, (each) => {
      for (const field of sampleFields) expect(read(field, cellText(field, each[field]))).toEqual(each[field])
    }))
  })

  it('is read back from CSV', () => {
    fc.assert(fc.property(fc.array(sample, { minLength: 1, maxLength: 5 }), (sheet) => {
      const rows = readSheetCsv(writeSheet(sheet))?.rows ?? []
      expect(rows.map(row => sampleSchema.parse(Object.fromEntries(sampleFields.map(field => [field, read(field, row.cells[field] ?? '')]))))).toEqual(sheet)
    }))
  })
})
