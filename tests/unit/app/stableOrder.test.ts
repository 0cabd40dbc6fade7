import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { stableOrder } from '../../../app/utils/stableOrder'

const value = fc.oneof(fc.double(), fc.constantFrom(Number.NaN, 0, -0, 1, -1, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, 5e-324, Number.MAX_VALUE))
const key = (length: number) => fc.record({ values: fc.array(value, { minLength: length, maxLength: length }), descending: fc.boolean() })

/** The plain way: a comparison of two places by each key in turn. */
function plainOrder(length: number, keys: readonly { values: number[], descending: boolean }[]): number[] {
  return Array.from({ length }, (_, i) => i).sort((i, j) => {
    for (const { values, descending } of keys) {
      const [one = Number.NaN, other = Number.NaN] = [values[i], values[j]]
      if (Number.isNaN(one) || Number.isNaN(other)) {
        if (Number.isNaN(one) !== Number.isNaN(other)) return Number.isNaN(one) ? 1 : -1
      }
      else if (one !== other) { return (one < other) === descending ? 1 : -1 }
    }
    return i - j
  })
}

describe('a stable order by several keys', () => {
  it('is that of comparing two by two', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 40 }).chain(length => fc.tuple(fc.constant(length), fc.array(key(length), { maxLength: 3 }))), ([length, keys]) => {
      expect([...stableOrder(length, keys)]).toEqual(plainOrder(length, keys))
    }))
  })

  it('leaves places as they stand where nothing is asked or nothing differs', () => {
    expect([...stableOrder(4, [])]).toEqual([0, 1, 2, 3])
    expect([...stableOrder(3, [{ values: [7, 7, 7], descending: true }])]).toEqual([0, 1, 2])
    expect([...stableOrder(0, [{ values: [], descending: false }])]).toEqual([])
  })

  it('takes small whole numbers as they come in columns', () => {
    expect([...stableOrder(4, [{ values: Uint8Array.of(2, 9, 2, 0), descending: true }])]).toEqual([1, 0, 2, 3])
  })
})
