import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { pointGrid } from '../../../app/charts/pointGrid'

const place = fc.oneof(fc.integer({ min: -40, max: 140 }), fc.constant(Number.NaN))
const points = fc.array(fc.tuple(place, place), { maxLength: 60 })

/** All points, one after the other. */
function bruteNearest(all: readonly (readonly [number, number])[], x: number, y: number, within: number): number {
  let found = -1
  let least = within * within
  all.forEach(([px, py], i) => {
    const distance = (px - x) ** 2 + (py - y) ** 2
    if (distance < least || (distance === least && found < 0)) [found, least] = [i, distance]
  })
  return found
}

describe('the nearest point', () => {
  it('is the one that a search through all points finds', () => {
    fc.assert(fc.property(points, fc.integer({ min: -60, max: 160 }), fc.integer({ min: -60, max: 160 }), fc.integer({ min: 0, max: 50 }), fc.integer({ min: 3, max: 40 }), (all, x, y, within, cell) => {
      const ids = all.map((_, i) => 1000 + i)
      const expected = bruteNearest(all, x, y, within)
      expect(pointGrid(all.map(([px]) => px), all.map(([, py]) => py), ids, cell).nearest(x, y, within)).toBe(expected < 0 ? -1 : 1000 + expected)
    }), { numRuns: 1000 })
  })

  it('is none among no points', () => {
    expect(pointGrid([], [], []).nearest(0, 0, 100)).toBe(-1)
    expect(pointGrid([Number.NaN], [1], [7]).nearest(0, 1, 100)).toBe(-1)
  })

  it('is the first of two at the same place, and one exactly as far as asked counts', () => {
    expect(pointGrid([5, 5], [5, 5], [3, 2]).nearest(6, 5, 1)).toBe(3)
  })
})
