import { describe, expect, it } from 'vitest'
import { ellipsePoints, groupEllipse, hotellingLimit } from '../../../shared/science/components/groupEllipse'
import { seededRandom } from '../../support/seededRandom'

const { normal } = seededRandom(21)
const x = Array.from({ length: 12 }, () => 3 + 2 * normal())
const y = x.map(value => 1 - 0.7 * value + 0.5 * normal())
const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length
const covariance = (a: number[], b: number[]) => a.reduce((sum, value, i) => sum + (value - mean(a)) * ((b[i] ?? 0) - mean(b)), 0) / (a.length - 1)

describe('the 95 % ellipse of a group', () => {
  it('has Hotelling\'s T² at its limit all around', () => {
    const ellipse = groupEllipse(x, y)
    if (!ellipse) throw new Error('no ellipse')
    const [xx, xy, yy] = [covariance(x, x), covariance(x, y), covariance(y, y)]
    for (const [px, py] of ellipsePoints(ellipse)) {
      const [dx, dy] = [px - mean(x), py - mean(y)]
      const squared = (yy * dx * dx - 2 * xy * dx * dy + xx * dy * dy) / (xx * yy - xy * xy)
      expect(squared / hotellingLimit(12)).toBeCloseTo(1, 9)
    }
  })

  it('is closed, and turns with the axes', () => {
    const [one, other] = [groupEllipse(x, y), groupEllipse(y, x)]
    if (!one || !other) throw new Error('no ellipse')
    const points = ellipsePoints(one, 36)
    expect(points).toHaveLength(37)
    expect(points[0]).toEqual(points[36])
    expect(other.greaterRadius).toBeCloseTo(one.greaterRadius, 9)
    expect(Math.tan(other.angleRadians) * Math.tan(one.angleRadians)).toBeCloseTo(1, 9)
  })

  it('needs five samples', () => {
    expect(groupEllipse(x.slice(0, 4), y.slice(0, 4))).toBeNull()
    expect(groupEllipse(x.slice(0, 5), y.slice(0, 5))).not.toBeNull()
    expect(groupEllipse([], [])).toBeNull()
  })

  it('is a line of samples on one line, and a point of equal ones', () => {
    const line = groupEllipse([1, 2, 3, 4, 5], [2, 4, 6, 8, 10])
    expect(line?.lesserRadius).toBeCloseTo(0, 6)
    expect(Math.tan(line?.angleRadians ?? 0)).toBeCloseTo(2)
    expect(groupEllipse([1, 1, 1, 1, 1], [2, 2, 2, 2, 2])).toMatchObject({ greaterRadius: 0, lesserRadius: 0 })
  })

  it('has no limit below three samples', () => {
    expect(hotellingLimit(2)).toBeNaN()
    expect(hotellingLimit(1000)).toBeCloseTo(6, 1)
  })
})
