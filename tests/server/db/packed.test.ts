import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { packFloat64, packInt32, unpackFloat64, unpackInt32 } from '../../../server/db/packed'

describe('packed columns', () => {
  it('come back as they went, from any offset', () => {
    fc.assert(fc.property(fc.float64Array(), fc.nat(9), (values, offset) => {
      const padded = Buffer.concat([Buffer.alloc(offset), packFloat64(values)])
      expect(unpackFloat64(padded.subarray(offset))).toEqual(values)
    }))
    fc.assert(fc.property(fc.int32Array(), fc.nat(9), (values, offset) => {
      const padded = Buffer.concat([Buffer.alloc(offset), packInt32(values)])
      expect(unpackInt32(padded.subarray(offset))).toEqual(values)
    }))
  })

  it('are little-endian doubles, so that a copied database reads the same elsewhere', () => {
    // IEEE 754: 1.5 is 0x3FF8000000000000.
    expect([...packFloat64(Float64Array.of(1.5))]).toEqual([0, 0, 0, 0, 0, 0, 0xF8, 0x3F])
    expect([...packInt32(Int32Array.of(-2))]).toEqual([0xFE, 0xFF, 0xFF, 0xFF])
  })

  it('keep "not detected"', () => {
    expect(unpackFloat64(packFloat64(Float64Array.of(Number.NaN, 2)))[0]).toBeNaN()
  })

  it('refuse bytes that are no whole number of values', () => {
    expect(() => unpackFloat64(new Uint8Array(7))).toThrow(RangeError)
  })
})
