// Reference: data/components.json, made by data/make-components.R with R 4.2.2 (prcomp, qf); each block there names its data's source.
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { hotellingLimit } from '../../shared/science/components/groupEllipse'
import { orient } from '../../shared/science/components/orient'
import { principalComponents } from '../../shared/science/components/principalComponents'
import { scaleFeatures, type ComponentScaling } from '../../shared/science/components/scaleFeatures'

interface Block { variance: number[], proportion: number[], loadings: number[][], scores: number[][] }
interface Reference {
  data: Record<'iris' | 'arrests' | 'wide', number[][]>
  iris: Record<'covariance' | 'correlation' | 'pareto', Block>
  arrests: { correlation: Block }
  wide: Block
  ellipse: { n: number, t2: number }[]
}
const reference = JSON.parse(readFileSync(new URL('data/components.json', import.meta.url), 'utf8')) as Reference

const cases: [string, keyof Reference['data'], ComponentScaling, Block][] = [
  ['iris, not scaled', 'iris', 'none', reference.iris.covariance],
  ['iris, unit variance', 'iris', 'unitVariance', reference.iris.correlation],
  ['iris, Pareto', 'iris', 'pareto', reference.iris.pareto],
  ['arrests, unit variance', 'arrests', 'unitVariance', reference.arrests.correlation],
  ['more features than samples', 'wide', 'none', reference.wide],
]
const column = (rows: number[][], k: number) => Float64Array.from(rows, row => row[k] ?? Number.NaN)

/** Within 1e-9 of the largest value of its column. */
function expectSame(actual: ArrayLike<number>, expected: Float64Array, what: string) {
  const size = Math.max(...expected.map(Math.abs))
  expected.forEach((value, i) => {
    expect(Math.abs((actual[i] ?? Number.NaN) - value) / size, `${what}, place ${i}: ${actual[i]} against ${value}`).toBeLessThan(1e-9)
  })
}

describe.each(cases)('principal components of %s', (_name, of, scaling, expected) => {
  const rows = reference.data[of]
  const samples = rows.length
  const features = rows[0]?.length ?? 0
  const scaled = scaleFeatures(Float64Array.from(rows.flat()), samples, features, scaling)

  it.each(['features', 'samples'] as const)('are those of the reference, by way of the %s', (way) => {
    const found = principalComponents(scaled, samples, features, { most: expected.variance.length, way })
    expect(found.scores).toHaveLength(expected.variance.length)
    expectSame(found.variance, Float64Array.from(expected.variance), 'variance')
    expected.variance.forEach((variance, k) => {
      expect(Math.abs((found.variance[k] ?? Number.NaN) / variance - 1), `variance ${k}`).toBeLessThan(1e-9)
      expect(Math.abs((found.share[k] ?? Number.NaN) / (expected.proportion[k] ?? Number.NaN) - 1), `share ${k}`).toBeLessThan(1e-9)
      const signed = orient({ scores: column(expected.scores, k), loadings: column(expected.loadings, k) })
      expectSame(found.loadings[k] ?? [], signed.loadings, `loadings of component ${k + 1}`)
      expectSame(found.scores[k] ?? [], signed.scores, `scores of component ${k + 1}`)
    })
  })
})

describe('the limit of the 95 % ellipse', () => {
  it.each(reference.ellipse)('for $n samples', ({ n, t2 }) => {
    expect(Math.abs(hotellingLimit(n) / t2 - 1)).toBeLessThan(1e-9)
  })
})
