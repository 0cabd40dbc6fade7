import { describe, expect, it } from 'vitest'
import { areaRule } from '../../../app/charts/foldArea'
import { PLACE, placeFeatures, placesOf } from '../../../app/charts/foldPoints'
import { filterFeatures } from '../../../app/utils/featureFilter'
import { rectangleArea } from '../../../app/utils/plotArea'
import { manyVerdicts } from '../../support/manyFeatures'

const { columns } = manyVerdicts(3000).result
const points = placeFeatures(columns)
const order = Int32Array.from({ length: 3000 }, (_, i) => i)
const inside = (area: Parameters<typeof areaRule>[1]) => filterFeatures(columns, order, { verdicts: [], rules: [areaRule(points, area)] })

describe('an area of the fold-change plot', () => {
  it('holds the features whose marks lie inside, and no other', () => {
    const found = inside(rectangleArea('certainty', [3, 1], [0, 4]))
    const expected = order.filter(i => points.place[i] === PLACE.ratios && points.x[i]! >= 1 && points.x[i]! <= 3 && points.y[i]! >= 0 && points.y[i]! <= 4)
    expect([...found]).toEqual([...expected])
    expect(found.length).toBeGreaterThan(20)
  })

  it('holds in a lane what stands there, by m/z and reach', () => {
    const found = inside(rectangleArea('laneB', [80, 500], [0, 9]))
    expect(found.length).toBeGreaterThan(5)
    for (const i of found) {
      expect(points.place[i]).toBe(PLACE.laneB)
      expect(columns.mz[i]).toBeLessThanOrEqual(500)
    }
  })

  it('holds nothing where the plot counts upwards by something else', () => {
    expect(inside(rectangleArea('abundance', [-99, 99], [-99, 99]))).toHaveLength(0)
  })

  it('gives places once a result', () => {
    expect(placesOf(columns)).toBe(placesOf(columns))
  })
})
