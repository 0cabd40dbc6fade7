import { describe, expect, it } from 'vitest'
import { GrowingFloats, GrowingIntegers } from '../../../../shared/science/table/growingColumn'
import { packColumns } from '../../../../shared/science/table/packColumns'

const bytesOf = (columns: Parameters<typeof packColumns>[0]) => packColumns(columns).flatMap(part => Array.from(part))

describe('packed columns', () => {
  it('are counts, then little-endian doubles', () => {
    const bytes = bytesOf({ mz: Float64Array.of(1), minutes: Float64Array.of(2), intensity: Float64Array.of(0.5), width: null })
    expect(bytes).toEqual([1, 0, 0, 0, 3, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0xF0, 0x3F, 0, 0, 0, 0, 0, 0, 0, 0x40, 0, 0, 0, 0, 0, 0, 0xE0, 0x3F])
  })
  it('tell three columns of four rows from four of three', () => {
    const ones = (length: number) => new Float64Array(length).fill(1)
    expect(bytesOf({ mz: ones(4), minutes: ones(4), intensity: ones(4), width: null })).not.toEqual(bytesOf({ mz: ones(3), minutes: ones(3), intensity: ones(3), width: ones(3) }))
  })
  it('hold a part of a larger array only', () => {
    expect(packColumns({ mz: new Float64Array([9, 1, 9]).subarray(1, 2), minutes: Float64Array.of(1), intensity: Float64Array.of(1), width: null })[1]?.length).toBe(8)
  })
})

describe('growing columns', () => {
  it.each([0, 3, 5, 70_000])('hold the same whatever number was expected: %i', (expected) => {
    const floats = new GrowingFloats(expected)
    for (let value = 0; value < 70_000; value++) floats.push(value)
    expect(floats.length).toBe(70_000)
    expect([floats.at(2), floats.at(65_540), floats.at(69_999)]).toEqual([2, 65_540, 69_999])
    expect(floats.take().every((value, index) => value === index)).toBe(true)
    expect(floats.take().length).toBe(70_000)
  })
  it('give back all values over the edges of their blocks', () => {
    const floats = new GrowingFloats()
    const integers = new GrowingIntegers()
    for (let index = 0; index < 140_000; index++) {
      floats.push(index / 2)
      integers.push(index)
    }
    expect([floats.at(0), floats.at(65_536), floats.at(139_999), floats.at(150_000)]).toEqual([0, 32_768, 69_999.5, Number.NaN])
    const all = floats.take()
    expect(all.length).toBe(140_000)
    expect(all.every((value, index) => value === index / 2)).toBe(true)
    expect([new GrowingFloats().take().length, new GrowingIntegers().take().length]).toEqual([0, 0])
    expect(integers.take().every((value, index) => value === index)).toBe(true)
      })
})
