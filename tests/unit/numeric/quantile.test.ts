import { describe, expect, it } from 'vitest'
import { interpolate } from '../../../shared/science/numeric/interpolate'
import { median } from '../../../shared/science/numeric/median'
import { quantile } from '../../../shared/science/numeric/quantile'

describe('quantile', () => {
  it('is linear between neighbours: type 7 of Hyndman & Fan 1996', () => {
    // R: quantile(c(1, 2, 4, 8, 16), c(0, .1, .25, .9, 1))
    const values = [16, 2, 8, 1, 4]
    expect([0, 0.1, 0.25, 0.9, 1].map(share => quantile(values, share))).toEqual([1, 1.4, 2, 12.8, 16])
  })

  it('of nothing is not a number, of one value that value', () => {
    expect(quantile([], 0.5)).toBeNaN()
    expect(quantile([7], 0.02)).toBe(7)
  })
})

describe('median', () => {
  it('is the middle value, or the mean of the middle two, and changes nothing', () => {
    const values = Float64Array.of(3, 1, 2)
    expect(median(values)).toBe(2)
    expect(values).toEqual(Float64Array.of(3, 1, 2))
    expect(median([4, 1, 3, 2])).toBe(2.5)
    expect(median([])).toBeNaN()
  })
})

describe('interpolate', () => {
  const x = Float64Array.of(1, 2, 4)
  const y = Float64Array.of(10, 20, 0)
  it('runs straight between knots and level outside', () => {
    expect([0, 1, 1.5, 2, 3, 4, 9].map(at => interpolate(x, y, at))).toEqual([10, 10, 15, 20, 10, 0, 0])
  })
  it('without knots is 0', () => {
    expect(interpolate(new Float64Array(0), new Float64Array(0), 3)).toBe(0)
  })
})
