import { describe, expect, it } from 'vitest'
import { estimateFloor } from '../../../shared/science/verdict/estimateFloor'

describe('estimateFloor', () => {
  it('is the 2nd percentile from 50 rows on', () => {
    expect(estimateFloor(Float64Array.from({ length: 101 }, (_, i) => 100 - i + 1))).toBeCloseTo(3, 12)
    expect(estimateFloor(Float64Array.from({ length: 51 }, (_, i) => i + 1))).toBeCloseTo(2, 12)
  })

  it('is the minimum under 50 rows', () => {
    expect(estimateFloor([30, 10, 20])).toBe(10)
    expect(estimateFloor(Array.from({ length: 49 }, (_, i) => 49 - i))).toBe(1)
  })

  it('leaves out what was not detected, and does not guess for an empty table', () => {
    expect(estimateFloor([Number.NaN, 5, 0])).toBe(5)
    expect(estimateFloor([])).toBeNaN()
  })

  it('leaves its input alone', () => {
    const values = Float64Array.from([3, 1, 2])
    estimateFloor(values)
    expect([...values]).toEqual([3, 1, 2])
  })
})
