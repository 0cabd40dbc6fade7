import { describe, expect, it } from 'vitest'
import { chooseFeatures } from '../../../shared/science/components/chooseFeatures'
import { fillMissing } from '../../../shared/science/components/fillMissing'
import { sampleComponents } from '../../../shared/science/components/sampleComponents'
import { scaleFeatures } from '../../../shared/science/components/scaleFeatures'
import { VERDICT } from '../../../shared/science/verdict/verdicts'
import { blank, judge, none, onA, onB } from '../../support/comparisonInput'
import { manyVerdicts } from '../../support/manyFeatures'

const columns = (rows: number[][]) => rows.map(row => Float64Array.from(row))
const all = (count: number) => Int32Array.from({ length: count }, (_, i) => i)

describe('filling what is missing', () => {
  it('takes half the feature\'s minimum over these samples, and counts it', () => {
    const intensity = columns([[8, none, 32, none, 5], [4, 16, 32, none, 0], [none, 64, 32, none, 7]])
    const filled = fillMissing(intensity, [1, 1, 1], all(5))
    expect(filled).toMatchObject({ filledValues: 3, filledFeatures: 3, notFound: 1, withoutSpread: 1 })
    expect([...filled.features]).toEqual([0, 1, 4])
    const expected = [3, 3, Math.log2(5), 2, 4, Math.log2(5) - 1, 1, 6, Math.log2(7)]
    expect([...filled.values]).toEqual(expected)
    expect([...filled.filledOfSample]).toEqual([1, 1, 1])
    expect([...filled.filledOfFeature]).toEqual([1, 1, 1])
    expect(intensity[0]?.[1]).toBeNaN()
  })

  it('works on normalised values, of the features asked for', () => {
    const filled = fillMissing(columns([[1, 8, 100], [1, none, 100], [1, 32, 100]]), [2, 1, 0.5], Int32Array.of(1))
    expect([...filled.values]).toEqual([4, 3, 4])
  })

  it('keeps a feature of a single sample: the others stand at half of it', () => {
    expect([...fillMissing(columns([[8], [none], [none]]), [1, 1, 1], all(1)).values]).toEqual([3, 2, 2])
  })
})

describe('scaling', () => {
  const values = Float64Array.from([1, 10, 3, 3, 10, 7, 5, 10, 2])
  it.each([['none', 2, 0], ['unitVariance', 1, 0], ['pareto', Math.SQRT2, 0]] as const)('%s', (scaling, first, second) => {
    const scaled = scaleFeatures(values, 3, 3, scaling)
    expect(scaled[0]).toBeCloseTo(-first)
    expect(scaled[6]).toBeCloseTo(first)
    expect([scaled[1], scaled[4], scaled[7]]).toEqual([second, second, second])
    for (let j = 0; j < 3; j++) expect((scaled[j] ?? 0) + (scaled[3 + j] ?? 0) + (scaled[6 + j] ?? 0)).toBeCloseTo(0, 12)
  })
})

describe('which features take part', () => {
  const { result } = judge([
    onA('M1', [500, 500, none, 300, none, 900]), onA('M2', [510, none, none, 310, none, 950]),
    onB('T1', [490, 480, 700, none, 400, 1000]), onB('T2', [505, none, 720, none, none, 930]),
    blank('blank', [none, none, none, none, none, 900]),
  ])

  it('leaves out what is set aside and what no side has', () => {
    expect(result.columns.verdict[5]).toBe(VERDICT.setAside)
    expect(chooseFeatures(result, 0.8, 'oneSide')).toEqual({ features: Int32Array.of(0, 2, 3), setAside: 1, notPresent: 2 })
    expect(chooseFeatures(result, 0.8, 'bothSides')).toEqual({ features: Int32Array.of(0), setAside: 1, notPresent: 4 })
  })

  it('counts a side that is not above the blanks as not found', () => {
    const { result: borne } = judge([onA('M1', [5000]), onA('M2', [5100]), onB('T1', [1000]), onB('T2', [1010]), blank('blank', [900])])
    expect(chooseFeatures(borne, 0.8, 'oneSide').features).toHaveLength(1)
    expect(chooseFeatures(borne, 0.8, 'bothSides').features).toHaveLength(0)
  })
})

describe('principal components of samples', () => {
  const many = manyVerdicts(400)
  const { features } = chooseFeatures(many.result, 0.8, 'oneSide')
  const ask = { intensity: many.input.intensity.slice(0, 6), factors: [1, 1, 1, 1, 1, 1], features, scaling: 'none', most: 5 } as const

  it('parts the sides of a comparison, and says what was filled and left out', () => {
    const found = sampleComponents(ask)
    const [first] = found.scores
    const signs = Array.from(first ?? [], Math.sign)
    expect(new Set(signs.slice(0, 3)).size).toBe(1)
    expect(signs.slice(3)).toEqual(signs.slice(0, 3).map(sign => -sign))
    expect(found.filledValues).toBe(ask.intensity.reduce((sum, column) => sum + features.filter(i => Number.isNaN(column[i])).length, 0))
    expect(found.features.length + found.notFound + found.withoutSpread).toBe(features.length)
    expect(found.loadings[0]).toHaveLength(found.features.length)
  })

  it('does not depend on the unit of intensity', () => {
    const one = sampleComponents(ask)
    const other = sampleComponents({ ...ask, factors: ask.factors.map(() => 1000) })
    one.scores[0]?.forEach((score, i) => expect(other.scores[0]?.[i]).toBeCloseTo(score, 9))
  })

  it('tells how far it has come, never back', () => {
    const shares: number[] = []
    sampleComponents(ask, share => shares.push(share))
    expect(shares.length).toBeGreaterThan(2)
    expect(shares).toEqual([...shares].sort((a, b) => a - b))
    expect(shares.at(-1)).toBeLessThanOrEqual(1)
  })

  it.each([
    ['two samples', [[1, 2, 3], [2, 2, 9]], 1],
    ['all equal', [[1, 2], [1, 2], [1, 2]], 0],
    ['one feature', [[1], [2], [5]], 1],
    ['all missing', [[none, none], [none, none], [none, none]], 0],
    ['no feature', [[], [], []], 0],
    ['one sample', [[4, 5]], 0],
    ['no sample', [], 0],
  ])('stands awkward input: %s', (_what, rows, rank) => {
    for (const scaling of ['none', 'unitVariance', 'pareto'] as const) {
      const found = sampleComponents({ intensity: columns(rows), factors: rows.map(() => 1), features: all(rows[0]?.length ?? 0), scaling, most: 5 })
      expect(found.rank).toBe(rank)
      expect(found.scores).toHaveLength(rank)
      for (const list of [...found.scores, ...found.loadings, found.variance, found.share]) expect(list.every(Number.isFinite)).toBe(true)
    }
  })
})
