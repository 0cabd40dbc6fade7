import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { gramMatrix } from '../../../shared/science/components/gramMatrix'
import { orient } from '../../../shared/science/components/orient'
import { principalComponents } from '../../../shared/science/components/principalComponents'
import { scaleFeatures } from '../../../shared/science/components/scaleFeatures'
import { seededRandom } from '../../support/seededRandom'

const table = (samples: number, features: number, seed = 3) => {
  const { normal } = seededRandom(seed)
  const level = Array.from({ length: features }, () => 12 + 2 * normal())
  const spread = Array.from({ length: features }, () => 0.2 + Math.abs(normal()))
  return Float64Array.from({ length: samples * features }, (_, at) => (level[at % features] ?? 0) + (spread[at % features] ?? 0) * normal())
}
const centred = (samples: number, features: number, seed?: number) => scaleFeatures(table(samples, features, seed), samples, features, 'none')
const closeTo = (actual: ArrayLike<number>, expected: ArrayLike<number>, within = 1e-9) => {
  expect(actual.length).toBe(expected.length)
  const size = Math.max(...Array.from(expected, Math.abs))
  Array.from(expected, (value, i) => expect(Math.abs((actual[i] ?? Number.NaN) - value) / size).toBeLessThan(within))
}

describe('the Gram matrix', () => {
  it.each([[1, 3], [2, 700], [5, 513], [8, 1024], [7, 1]])('of %i samples × %i features is that of a plain product', (samples, features) => {
    const values = table(samples, features)
    const plain = Float64Array.from({ length: samples * samples }, (_, at) => {
      let sum = 0
      for (let k = 0; k < features; k++) sum += (values[Math.floor(at / samples) * features + k] ?? 0) * (values[(at % samples) * features + k] ?? 0)
      return sum
    })
    const shares: number[] = []
    closeTo(gramMatrix(values, samples, features, share => shares.push(share)), plain, 1e-12)
    expect(shares.at(-1)).toBe(1)
  })
})

describe('principal components', () => {
  it('are the same both ways, tall and wide', () => {
    fc.assert(fc.property(fc.integer({ min: 3, max: 12 }), fc.integer({ min: 2, max: 30 }), fc.integer({ min: 1, max: 99 }), (samples, features, seed) => {
      const values = centred(samples, features, seed)
      const most = Math.min(2, samples - 1, features)
      const one = principalComponents(values, samples, features, { most, way: 'samples' })
      const other = principalComponents(values, samples, features, { most, way: 'features' })
      expect(one.rank).toBe(other.rank)
      closeTo(one.variance, other.variance)
      for (let k = 0; k < most; k++) {
        closeTo(one.scores[k] ?? [], other.scores[k] ?? [], 1e-7)
        closeTo(one.loadings[k] ?? [], other.loadings[k] ?? [], 1e-7)
      }
    }), { numRuns: 60, seed: 11 })
  })

  it('give back the table: scores × loadings', () => {
    const values = centred(6, 20)
    const { scores, loadings, rank } = principalComponents(values, 6, 20, { most: 99 })
    expect(rank).toBe(5)
    expect(scores).toHaveLength(5)
    closeTo(Float64Array.from(values, (_, at) => scores.reduce((sum, each, k) => sum + (each[Math.floor(at / 20)] ?? 0) * (loadings[k]?.[at % 20] ?? 0), 0)), values)
  })

  it('have loadings of length 1 at right angles, scores of the variance stated, and shares that add up', () => {
    const { scores, loadings, variance, share } = principalComponents(centred(9, 40), 9, 40, { most: 8 })
    const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, value, i) => sum + value * (b[i] ?? Number.NaN), 0)
    loadings.forEach((one, k) => loadings.forEach((other, l) => expect(dot(one, other)).toBeCloseTo(k === l ? 1 : 0, 9)))
    scores.forEach((one, k) => expect(dot(one, one) / 8).toBeCloseTo(variance[k] ?? Number.NaN, 9))
    expect(share.reduce((sum, each) => sum + each, 0)).toBeCloseTo(1, 12)
    expect([...variance]).toEqual([...variance].sort((a, b) => b - a))
  })

  it('follow the samples into another order, and leave the table as it was', () => {
    const values = centred(5, 12)
    const before = values.slice()
    const order = [3, 0, 4, 1, 2]
    const turned = Float64Array.from(order.flatMap(i => [...values.slice(i * 12, i * 12 + 12)]))
    const one = principalComponents(values, 5, 12)
    const other = principalComponents(turned, 5, 12)
    closeTo(other.variance, one.variance)
    closeTo(other.loadings[0] ?? [], one.loadings[0] ?? [])
    closeTo(other.scores[0] ?? [], order.map(i => one.scores[0]?.[i] ?? Number.NaN))
    expect(values).toEqual(before)
  })

  it('grow with the unit: twice the values, four times the variance', () => {
    const values = centred(6, 15)
    const { variance } = principalComponents(values, 6, 15)
    closeTo(principalComponents(values.map(value => 2 * value), 6, 15).variance, variance.map(value => 4 * value))
  })

  it.each(['samples', 'features'] as const)('are no more than the rank, by way of the %s', (way) => {
    const line = Float64Array.from([1, 2, 3, -2, -4, -6, 1, 2, 3])
    const { rank, share, scores } = principalComponents(line, 3, 3, { way })
    expect(rank).toBe(1)
    expect(scores).toHaveLength(1)
    expect(share[0]).toBeCloseTo(1, 12)
  })

  it.each(['samples', 'features'] as const)('are none where nothing varies, by way of the %s', (way) => {
    expect(principalComponents(new Float64Array(12), 3, 4, { way })).toMatchObject({ rank: 0, scores: [], loadings: [] })
  })

  it('are none of one sample or no feature, one of two samples, one of one feature', () => {
    expect(principalComponents(new Float64Array(4), 1, 4).rank).toBe(0)
    expect(principalComponents(new Float64Array(0), 4, 0).rank).toBe(0)
    const two = principalComponents(scaleFeatures(Float64Array.from([1, 2, 3, 5]), 2, 2, 'none'), 2, 2)
    expect(two.rank).toBe(1)
    closeTo(two.loadings[0] ?? [], [2 / Math.sqrt(13), 3 / Math.sqrt(13)])
    const single = principalComponents(Float64Array.from([-1, 0, 1]), 3, 1)
    closeTo(single.scores[0] ?? [], [-1, 0, 1])
    closeTo(single.variance, [1])
  })
})

describe('the sign of a component', () => {
  it('makes the largest loading positive and turns the scores with it', () => {
    const turned = orient({ scores: Float64Array.of(1, -2), loadings: Float64Array.of(0.2, -0.9, 0.3) })
    expect([...turned.scores]).toEqual([-1, 2])
    expect([...turned.loadings]).toEqual([-0.2, 0.9, -0.3])
    expect(orient(turned)).toEqual(turned)
  })

  it('lets the first of equally large loadings decide, whatever rounding says', () => {
    const almost = orient({ scores: Float64Array.of(1), loadings: Float64Array.of(-0.5, 0.5000000000001) })
    expect(almost.loadings[0]).toBe(0.5)
  })
})
