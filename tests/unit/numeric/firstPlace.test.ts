import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { firstAbove, firstNotBelow, firstPlace } from '../../../shared/science/numeric/firstPlace'

describe('the first place', () => {
  it('of what holds nowhere, everywhere, or from some place on', () => {
    expect(firstPlace(0, () => true)).toBe(0)
    expect(firstPlace(5, () => false)).toBe(5)
    expect(firstPlace(5, () => true)).toBe(0)
    expect(firstPlace(1_000_000, place => place >= 765_432)).toBe(765_432)
  })

  it('in a column: before what is equal, or after it', () => {
    const column = Float64Array.of(1, 2, 2, 2, 5)
    expect([0, 1, 2, 3, 5, 6].map(value => firstNotBelow(column, value))).toEqual([0, 0, 1, 4, 4, 5])
    expect([0, 1, 2, 3, 5, 6].map(value => firstAbove(column, value))).toEqual([0, 1, 4, 4, 5, 5])
  })

  it('agrees with a look at every value', () => {
    fc.assert(fc.property(fc.array(fc.integer({ min: -9, max: 9 })), fc.integer({ min: -10, max: 10 }), (values, value) => {
      const column = Float64Array.from(values).sort()
      expect(firstNotBelow(column, value)).toBe(column.filter(each => each < value).length)
      expect(firstAbove(column, value)).toBe(column.filter(each => each <= value).length)
    }))
  })
})
