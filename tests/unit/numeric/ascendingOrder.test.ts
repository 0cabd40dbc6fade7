import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ascendingOrder } from '../../../shared/science/numeric/ascendingOrder'

const stableOrder = (keys: Float64Array) => Int32Array.from([...keys.keys()].sort((a, b) => (keys[a] ?? 0) - (keys[b] ?? 0) || a - b))

describe('ascendingOrder', () => {
  it('orders any numbers as a stable sort does, few and many', () => {
    const number = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.integer({ min: -3, max: 3 }).map(n => n / 2))
    for (const length of [0, 1, 30, 1000]) {
      fc.assert(fc.property(fc.array(number, { minLength: length, maxLength: length }), (values) => {
        const keys = Float64Array.from(values)
        expect(ascendingOrder(keys)).toEqual(stableOrder(keys))
      }), { numRuns: 20 })
    }
  })

  it('keeps a given order among equal keys, so that keys can be sorted one after the other', () => {
    const first = Float64Array.from({ length: 2000 }, (_, i) => (i * 7919) % 13)
    const second = Float64Array.from({ length: 2000 }, (_, i) => Math.sin(i))
    const order = ascendingOrder(first, ascendingOrder(second))
    for (let i = 1; i < order.length; i++) {
      const [a, b] = [order[i - 1] ?? 0, order[i] ?? 0]
      const step = (first[b] ?? 0) - (first[a] ?? 0) || (second[b] ?? 0) - (second[a] ?? 0)
      expect(step).toBeGreaterThanOrEqual(0)
    }
  })

  it('changes neither keys nor the given order', () => {
    const keys = Float64Array.from({ length: 600 }, (_, i) => -i)
    const start = Int32Array.from({ length: 600 }, (_, i) => 599 - i)
    ascendingOrder(keys, start)
    expect(keys[10]).toBe(-10)
    expect(start[0]).toBe(599)
  })
})
