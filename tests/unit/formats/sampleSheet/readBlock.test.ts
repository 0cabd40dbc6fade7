import { describe, expect, it } from 'vitest'
import { readPasted, readSheetCsv } from '../../../../shared/formats/sampleSheet/readBlock'

const cells = (text: string, start: Parameters<typeof readPasted>[1] = 'name') => readPasted(text, start).rows.map(row => row.cells)

describe('a pasted block', () => {
  it('without heads follows the columns from where it is put', () => {
    expect(cells('one\tblank\ntwo\tQC\r\n')).toEqual([{ name: 'one', kind: 'blank' }, { name: 'two', kind: 'QC' }])
    expect(cells('10\tmg', 'amount')).toEqual([{ amount: '10', amountUnit: 'mg' }])
  })

  it('keeps empty rows and cells where it has no heads, so that rows stay where they are', () => {
    expect(cells('a\n\nb')).toEqual([{ name: 'a' }, { name: '' }, { name: 'b' }])
    expect(cells('a\t\tA')).toEqual([{ name: 'a', kind: '', side: 'A' }])
  })

  it('says how many columns lay beyond the last', () => {
    expect(readPasted('3\tb1\tx\ty', 'runOrder')).toMatchObject({ headed: false, beyond: 2, rows: [{ cells: { runOrder: '3', batch: 'b1' } }] })
  })

  it('with heads takes its columns by their words, in any order, and names what it left out', () => {
    const block = readPasted('Group\tSample name\tRack\tInj. vol.\nA\tone\t7\t2,5\n\nB\ttwo\t8\t3', 'batch')
    expect(block).toMatchObject({ headed: true, unknown: ['Rack'] })
    expect(block.rows).toEqual([{ line: 2, cells: { side: 'A', name: 'one', injectionUl: '2,5' } }, { line: 4, cells: { side: 'B', name: 'two', injectionUl: '3' } }])
  })

  it.each([
    ['weight (mg)', '12,5', { amount: '12,5', amountUnit: 'mg' }],
    ['Weight [g]', '0,3', { amount: '300', amountUnit: 'mg' }],
    ['amount in mL', '2', { amount: '2', amountUnit: 'mL' }],
    ['amount µg', '500', { amount: '0.5', amountUnit: 'mg' }],
    ['Volume (µL)', '1500', { volumeMl: '1.5' }],
    ['volume μl', '0.3', { volumeMl: '0.0003' }],
    ['injection volume (nL)', '500', { injectionUl: '0.5' }],
    ['amount (mg)', 'lost', { amount: 'lost', amountUnit: 'mg' }],
  ])('reads the unit of the head %j', (head, text, expected) => {
    expect(cells(`name\t${head}\nx\t${text}`)).toEqual([{ name: 'x', ...expected }])
  })

  it('leaves out a column whose unit makes no sense for it', () => {
    expect(readPasted('name\tvolume (mg)\tkind\nx\t1\tQC', 'name')).toMatchObject({ unknown: ['volume (mg)'] })
  })

  it('takes an amount with its unit apart', () => {
    expect(cells('name\tamount\nx\t12,5 mg\ny\t2 mL\nz\t7')).toEqual([{ name: 'x', amount: '12,5', amountUnit: 'mg' }, { name: 'y', amount: '2', amountUnit: 'mL' }, { name: 'z', amount: '7' }])
  })

  it('does not take names or kinds for heads', () => {
    expect(readPasted('sample\nblank', 'kind').headed).toBe(false)
    expect(readPasted('sample\tblank\nx\tQC', 'name').headed).toBe(false)
    expect(readPasted('name\tbatch\t1', 'name').headed).toBe(false)
  })

  it('takes the first of two heads that mean the same', () => {
    expect(readPasted('sample\tname\tside\nx\ty\tA', 'name')).toMatchObject({ unknown: ['name'], rows: [{ cells: { name: 'x', side: 'A' } }] })
  })

  it('reads quoted cells with line breaks and tabs as one', () => {
    expect(cells('"bottle\n1"\tQC')).toEqual([{ name: 'bottle 1', kind: 'QC' }])
  })

  it('of nothing is one empty cell', () => {
    expect(cells('')).toEqual([])
    expect(cells('\n')).toEqual([])
  })
})

describe('a CSV of samples', () => {
  it.each([',', ';', '\t'])('is read with %j between the cells', (delimiter) => {
    const block = readSheetCsv(['\uFEFFname,amount (mg),side', 'one,"1,5",A', 'two,2,B'].join('\r\n').replaceAll(',', delimiter).replaceAll(`1${delimiter}5`, '1,5'))
    expect(block?.rows.map(row => row.cells)).toEqual([{ name: 'one', amount: '1,5', amountUnit: 'mg', side: 'A' }, { name: 'two', amount: '2', amountUnit: 'mg', side: 'B' }])
  })

  it('counts lines as an editor does', () => {
    const block = readSheetCsv('name,batch\n\n"one\nstill one",b\n\ntwo,c')
    expect(block?.rows.map(row => row.line)).toEqual([3, 6])
  })

  it('takes the guard against formulas away', () => {
    expect(readSheetCsv('name,batch\n\'=1+1,\'-\n')?.rows[0]?.cells).toEqual({ name: '=1+1', batch: '-' })
  })

  it('needs a head that names the samples', () => {
    expect(readSheetCsv('kind,side\nQC,A')).toBeNull()
    expect(readSheetCsv('one,A\ntwo,B')).toBeNull()
    expect(readSheetCsv('')).toBeNull()
  })
})
