import { describe, expect, it } from 'vitest'
import { placeBlock, placeByName } from '../../../app/utils/sampleSheet/placeBlock'
import { previewImport } from '../../../app/utils/sampleSheet/previewImport'
import { readTextFile } from '../../../app/utils/sampleSheet/readTextFile'
import { sheetCautions } from '../../../app/utils/sampleSheet/sheetCautions'
import { sampleSchema } from '../../../shared/schemas/sample'

const names = { sideAName: 'Millrace', sideBName: 'Tallow Lane' }

describe('a CSV about to come in', () => {
  it('says what is new, what changes, what is left out and what is wrong, by line and column', () => {
    const preview = previewImport('name,kind,amount (mg),Rack\none,QC,1,2\n,blank,1,2\ntwo,water,ten,3\nTWO,blank,1,1\n', new Set(['one']), names)
    expect(preview).toMatchObject({ added: 1, changed: 1, unknown: ['Rack'] })
    expect(preview?.rows.map(row => row.name)).toEqual(['one', 'two'])
    expect(preview?.refused).toEqual([
      { line: 3, column: 'name', text: '', sentence: 'A sample needs a name.' },
      { line: 5, column: 'name', text: 'TWO', sentence: 'Line 4 has this name already.' },
    ])
    expect(preview?.marked).toEqual([
      { line: 4, column: 'kind', text: 'water', sentence: 'Not a kind: sample, solvent blank, process blank, pooled QC or standard.' },
      { line: 4, column: 'amount', text: 'ten', sentence: 'Not a number. Use digits with a point or a comma.' },
    ])
  })

  it('is none without names of columns', () => expect(previewImport('a,b\n1,2', new Set(), names)).toBeNull())
})

describe('bytes of a file', () => {
  const bytes = (...values: number[]) => Uint8Array.from(values)
  it('are read by mark, as UTF-8, or as an older spreadsheet writes them', () => {
    expect(readTextFile(bytes(0xFF, 0xFE, 0x61, 0, 0xB5, 0))).toEqual({ text: 'aµ' })
    expect(readTextFile(bytes(0x61, 0xC2, 0xB5))).toEqual({ text: 'aµ' })
    expect(readTextFile(bytes(0x61, 0xB5))).toEqual({ text: 'aµ' })
    expect(readTextFile(bytes(0x50, 0x4B, 3, 4))).toHaveProperty('sentence')
  })
})

describe('rows of texts', () => {
  const more = (count: number) => Array.from({ length: count }, (_, index) => `new-${index}`)
  it('go into the rows from a place on, and into new ones beyond the end', () => {
    expect(placeBlock([{ name: 'x' }, { name: 'y', side: '' }], ['a', 'b'], 1, more)).toEqual([{ key: 'b', field: 'name', text: 'x' }, { key: 'new-0', field: 'name', text: 'y' }, { key: 'new-0', field: 'side', text: '' }])
  })

  it('find their samples by name, and leave what stands where they are empty', () => {
    expect(placeByName([{ name: 'ONE', side: '' }, { name: 'z', side: 'A' }], new Map([['one', 'a']]), more))
      .toEqual([{ key: 'a', field: 'name', text: 'ONE' }, { key: 'new-0', field: 'name', text: 'z' }, { key: 'new-0', field: 'side', text: 'A' }])
  })
})

describe('cautions on a sheet', () => {
  const sample = (side: 'A' | 'B' | null, runOrder: number | null, batch = '', rest: object = {}) => sampleSchema.parse({ name: 'n', side, runOrder, batch, ...rest })
  it('name sides that follow the run order', () => {
    expect(sheetCautions([sample('A', 1), sample('A', 2), sample('B', 3), sample('B', 4)], names)).toEqual([expect.stringContaining('The sides follow the run order: all injections of one of Millrace and Tallow Lane')])
    expect(sheetCautions([sample('A', 1), sample('B', 2), sample('A', 3), sample('B', 4)], names)).toEqual([])
  })

  it('name sides that follow the batches', () => {
    expect(sheetCautions([sample('A', null, 'x'), sample('B', null, 'y')], names)).toEqual([expect.stringContaining('no batch holds samples of both')])
    expect(sheetCautions([sample('A', null, 'x'), sample('B', null, 'x')], names)).toEqual([])
  })

  it('count samples only, not blanks', () => {
    const kind = { kind: 'solventBlank' }
    expect(sheetCautions([sample('A', 1), sample('A', 2), sample('B', 3, '', kind), sample('B', 4, '', kind)], names)).toEqual([])
  })

  it('name amounts in two units', () => {
    expect(sheetCautions([sample('A', null, '', { amount: 1 }), sample('B', null, '', { amount: 1, amountUnit: 'mL' })], names)).toEqual([expect.stringContaining('some in mL')])
  })
})
