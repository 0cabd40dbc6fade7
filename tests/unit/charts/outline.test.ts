import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { insideOutline, simplifyOutline } from '../../../app/charts/outline'
import type { Corner } from '../../../app/utils/plotArea'
import { seededRandom } from '../../support/seededRandom'

const whole = fc.integer({ min: -8, max: 8 })
const corner: fc.Arbitrary<Corner> = fc.tuple(whole, whole)
const outline = fc.array(corner, { minLength: 3, maxLength: 12 })

/** The slow way: how often the outline turns about the point, by the angles it is seen under; its edge by distance. */
function bruteInside(corners: readonly Corner[], x: number, y: number): boolean {
  let angle = 0
  for (const [i, [x1, y1]] of corners.entries()) {
    const [x0, y0] = corners.at(i - 1) ?? [0, 0]
    const along = Math.hypot(x1 - x0, y1 - y0)
    if (Math.abs(Math.hypot(x - x0, y - y0) + Math.hypot(x - x1, y - y1) - along) < 1e-9) return true
    const turn = Math.atan2(y1 - y, x1 - x) - Math.atan2(y0 - y, x0 - x)
    angle += turn - 2 * Math.PI * Math.round(turn / (2 * Math.PI))
  }
  return Math.round(angle / (2 * Math.PI)) !== 0
}

describe('inside an outline', () => {
  it('is what the angles say, for outlines that cross and touch themselves too', () => {
    fc.assert(fc.property(outline, corner, (corners, [x, y]) => {
      expect(insideOutline(corners)(x, y)).toBe(bruteInside(corners, x, y))
      expect(insideOutline(corners)(x + 0.5, y + 0.25)).toBe(bruteInside(corners, x + 0.5, y + 0.25))
    }), { numRuns: 500 })
  })

  it('depends on neither direction nor the first corner', () => {
    fc.assert(fc.property(outline, corner, fc.nat(11), (corners, [x, y], first) => {
      const turned = [...corners.slice(first % corners.length), ...corners.slice(0, first % corners.length)].reverse()
      expect(insideOutline(turned)(x, y)).toBe(insideOutline(corners)(x, y))
    }))
  })

  it('holds the edge of a rectangle, and all of a loop drawn over itself', () => {
    const square: Corner[] = [[0, 0], [2, 0], [2, 2], [0, 2]]
    for (const [x, y] of [[0, 0], [2, 2], [1, 0], [0, 1.5]] as const) expect(insideOutline(square)(x, y)).toBe(true)
    expect(insideOutline(square)(2.0001, 1)).toBe(false)
    expect(insideOutline([...square, ...square])(1, 1)).toBe(true)
  })

  it('holds nothing with fewer than three corners, nor what is no number', () => {
    expect(insideOutline([[0, 0], [1, 1]])(0, 0)).toBe(false)
    expect(insideOutline([[0, 0], [2, 0], [2, 2]])(Number.NaN, 1)).toBe(false)
  })
})

describe('a simplified outline', () => {
  it('has at most so many corners, all of them of the outline and in its order', () => {
    fc.assert(fc.property(fc.array(corner, { maxLength: 60 }), fc.integer({ min: 3, max: 20 }), (corners, most) => {
      const left = simplifyOutline(corners, most)
      expect(left).toHaveLength(Math.min(corners.length, most))
      let at = -1
      for (const one of left) {
        at = corners.findIndex((each, place) => place > at && each === one)
        expect(at).toBeGreaterThanOrEqual(0)
      }
    }))
  })

  it('leaves a circle a circle: of 20,000 points fewer than 1 % change sides', () => {
    const circle = Array.from({ length: 400 }, (_, i): Corner => [100 * Math.cos(i / 400 * 2 * Math.PI), 100 * Math.sin(i / 400 * 2 * Math.PI)])
    const isInside = insideOutline(simplifyOutline(circle, 32))
    const { uniform } = seededRandom(5)
    let changed = 0
    for (let i = 0; i < 20_000; i++) {
      const [x, y] = [240 * uniform() - 120, 240 * uniform() - 120]
      if (isInside(x, y) !== Math.hypot(x, y) <= 100) changed++
    }
    expect(changed).toBeLessThan(200)
  })
})
