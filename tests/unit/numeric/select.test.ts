import fc from 'fast-check'
import { expect, it } from 'vitest'
import { select } from '../../../shared/science/numeric/select'

it('select gives the k-th smallest, with the lesser before it and the greater after', () => {
  fc.assert(fc.property(fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 1, maxLength: 60 }), fc.nat(), (numbers, at) => {
    const values = Float64Array.from(numbers)
    const k = at % numbers.length
    expect(select(values, k)).toBe(Float64Array.from(numbers).sort()[k])
    values.forEach((value, i) => expect(i < k ? value <= (values[k] ?? 0) : value >= (values[k] ?? 0)).toBe(true))
  }), { numRuns: 300, seed: 6 })
})
