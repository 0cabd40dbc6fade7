import { describe, expect, it } from 'vitest'
import { DRAWN_WIDTH_MINUTES, drawFromFeatures, gridMinutes, gridOver, WIDTH_IN_DEVIATIONS } from '../../../shared/science/traces/drawFromFeatures'

const grid = { firstMinutes: 0, stepMinutes: 0.005, count: 2001 }
const area = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) * grid.stepMinutes
const one = { minutes: Float64Array.of(5), heights: Float64Array.of(1000) }

describe('traces drawn from features', () => {
  it('draws a Gaussian as high as the intensity, half as high half a width away', () => {
    const values = drawFromFeatures(one, grid, 'sum')
    expect(values[1000]).toBeCloseTo(1000, 9)
    for (const place of [990, 1010]) expect(values[place]).toBeCloseTo(500, 9)
    expect(values.indexOf(Math.max(...values))).toBe(1000)
  })

  it('agrees with the closed form at every point it draws', () => {
    const values = drawFromFeatures({ minutes: Float64Array.of(5.0013), heights: Float64Array.of(1000) }, grid, 'sum')
    const deviation = DRAWN_WIDTH_MINUTES / WIDTH_IN_DEVIATIONS
    gridMinutes(grid).forEach((time, g) => {
      const away = (time - 5.0013) / deviation
      expect(values[g]).toBeCloseTo(Math.abs(away) > 4 ? 0 : 1000 * Math.exp(-0.5 * away * away), 8)
    })
  })

  it('has the area of a Gaussian: height × width × √(π / (4·ln 2))', () => {
    const widthMinutes = Float64Array.of(0.2)
    for (const [features, width] of [[one, 0.1], [{ ...one, widthMinutes }, 0.2], [{ ...one, widthMinutes: Float64Array.of(Number.NaN) }, 0.1]] as const) {
      expect(area(drawFromFeatures(features, grid, 'sum')) / (1000 * width * Math.sqrt(Math.PI / (4 * Math.LN2)))).toBeCloseTo(1, 3)
    }
  })

  it('is the sum of its features, or the highest of them at each time', () => {
    const other = { minutes: Float64Array.of(5.06), heights: Float64Array.of(600) }
    const both = { minutes: Float64Array.of(5, 5.06), heights: Float64Array.of(1000, 600) }
    const [first, second] = [drawFromFeatures(one, grid, 'sum'), drawFromFeatures(other, grid, 'sum')]
    drawFromFeatures(both, grid, 'sum').forEach((value, g) => expect(value).toBeCloseTo((first[g] ?? 0) + (second[g] ?? 0), 9))
    drawFromFeatures(both, grid, 'highest').forEach((value, g) => expect(value).toBeCloseTo(Math.max(first[g] ?? 0, second[g] ?? 0), 9))
  })

  it('draws the chosen features alone', () => {
    const both = { minutes: Float64Array.of(5, 8), heights: Float64Array.of(1000, 600) }
    expect([...drawFromFeatures(both, grid, 'sum', Int32Array.of(0))]).toEqual([...drawFromFeatures(one, grid, 'sum')])
  })

  it('draws nothing where nothing was detected, and cuts what runs over the edge', () => {
    const none = { minutes: Float64Array.of(5, 5, Number.NaN), heights: Float64Array.of(Number.NaN, 0, 7) }
    expect(drawFromFeatures(none, grid, 'sum').every(value => value === 0)).toBe(true)
    expect(drawFromFeatures({ minutes: new Float64Array(0), heights: new Float64Array(0) }, grid, 'sum')).toHaveLength(2001)
    const edge = drawFromFeatures({ minutes: Float64Array.of(0, 10), heights: Float64Array.of(8, 9) }, grid, 'sum')
    expect(edge[0]).toBeCloseTo(8, 9)
    expect(edge[2000]).toBeCloseTo(9, 9)
  })

  it('refuses columns of different length and a step of 0', () => {
    expect(() => drawFromFeatures({ minutes: new Float64Array(2), heights: new Float64Array(1) }, grid, 'sum')).toThrow(RangeError)
    expect(() => drawFromFeatures(one, { ...grid, stepMinutes: 0 }, 'sum')).toThrow(RangeError)
  })
})

describe('the grid over all features', () => {
  it('has room for the flanks of the first and the last, and does not begin before the run', () => {
    const { firstMinutes, stepMinutes, count } = gridOver(Float64Array.of(4, 0.1, 9.5))
    expect(firstMinutes).toBe(0)
    expect(stepMinutes).toBeCloseTo(0.005, 12)
    expect(firstMinutes + (count - 1) * stepMinutes).toBeGreaterThanOrEqual(9.8)
    expect(gridOver(Float64Array.of(4)).firstMinutes).toBeCloseTo(3.7, 12)
  })

  it('draws every top at 99.8 % or more of its height', () => {
    const minutes = Float64Array.from({ length: 200 }, (_, i) => 1 + i * 0.7307)
    const all = gridOver(minutes)
    minutes.forEach((top) => {
      expect(Math.max(...drawFromFeatures({ minutes: Float64Array.of(top), heights: Float64Array.of(100) }, all, 'sum'))).toBeGreaterThan(99.8)
    })
  })

  it('stays small where one time is odd, and still draws every top', () => {
    for (const odd of [1e9, 1e300]) {
      const minutes = Float64Array.of(1, 2, odd)
      const all = gridOver(minutes)
      expect(all.count).toBeLessThanOrEqual(60_000)
      expect(gridMinutes(all).at(-1)).toBeGreaterThanOrEqual(odd)
      const [sum, highest] = (['sum', 'highest'] as const).map(combine => drawFromFeatures({ minutes, heights: Float64Array.of(100, 50, 70) }, all, combine))
      expect([Math.max(...sum ?? []), Math.max(...highest ?? [])]).toEqual([150, 100])
      expect(sum?.reduce((total, value) => total + value, 0)).toBeCloseTo(220, 6)
    }
  })

  it('is empty without features', () => {
    expect(gridOver(new Float64Array(0)).count).toBe(0)
    expect(gridMinutes(gridOver(new Float64Array(0)))).toHaveLength(0)
  })
})
