import { describe, expect, it } from 'vitest'
import { matchFeatures } from '../../../shared/science/verdict/matchFeatures'

const members = (...columns: number[][]) => columns.map(column => Int32Array.from(column))
const intensities = (...columns: number[][]) => columns.map(column => Float64Array.from(column))

describe('matchFeatures', () => {
  it('finds the same features in another order', () => {
    expect([...matchFeatures(members([2, 0, 1]), intensities([5, 6, 7]), members([0, 1, 2]))]).toEqual([2, 0, 1])
  })

  it('follows the most intense member, and the more intense half keeps a split feature', () => {
    const after = members([0, -1], [-1, 0])
    const before = members([0], [0])
    expect([...matchFeatures(after, intensities([100, Number.NaN], [Number.NaN, 90]), before)]).toEqual([0, -1])
    expect([...matchFeatures(after, intensities([80, Number.NaN], [Number.NaN, 90]), before)]).toEqual([-1, 0])
  })

  it('follows the stronger half where two features merge', () => {
    const after = members([0], [0])
    const before = members([0, -1], [-1, 0])
    expect([...matchFeatures(after, intensities([100], [900]), before)]).toEqual([1])
  })

  it('finds nothing for a member that is in no feature there', () => {
    expect([...matchFeatures(members([5]), intensities([100]), members([0, 1]))]).toEqual([-1])
    expect([...matchFeatures(members([]), intensities([]), members([]))]).toEqual([])
  })
})
