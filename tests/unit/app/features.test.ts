import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { filterFeatures, inOrder, rowOfFeature, type FeatureFilter } from '../../../app/utils/featureFilter'
import { orderFeatures, SORT_KEYS, sortValues } from '../../../app/utils/featureOrder'
import { parseSearch, searchRule } from '../../../app/utils/featureSearch'
import { VERDICT } from '../../../shared/science/verdict/verdicts'
import { manyVerdicts } from '../../support/manyFeatures'

const { result } = manyVerdicts(2000)
const { columns } = result
const all: FeatureFilter = { verdicts: [], rules: [] }
const flags = new Map([[3, [1]], [8, [1, 2]]])
const order = orderFeatures(columns, [])

describe('order of features', () => {
  it.each(SORT_KEYS)('by %s: every feature once, values in order, none last', (key) => {
    const values = sortValues(columns, key, flags)
    for (const descending of [false, true]) {
      const sorted = orderFeatures(columns, [{ key, descending }], flags)
      expect([...sorted].sort((i, j) => i - j)).toEqual([...order])
      for (let row = 1; row < sorted.length; row++) {
        const [before, here] = [values[sorted[row - 1]!]!, values[sorted[row]!]!]
        if (Number.isNaN(before)) expect(here).toBeNaN()
        else if (!Number.isNaN(here)) expect(descending ? before >= here : before <= here).toBe(true)
      }
    }
  })

  it('goes by further keys where the first are equal', () => {
    const sorted = orderFeatures(columns, [{ key: 'verdict', descending: true }, { key: 'q', descending: false }, { key: 'mz', descending: true }])
    const [place, { q, mz }] = [sortValues(columns, 'verdict'), columns]
    for (let row = 1; row < sorted.length; row++) {
      const [i, j] = [sorted[row - 1]!, sorted[row]!]
      expect(place[i]).toBeGreaterThanOrEqual(place[j]!)
      if (place[i] !== place[j]) continue
      if (Number.isNaN(q[i])) expect(q[j]).toBeNaN()
      else if (!Number.isNaN(q[j])) expect(q[i]).toBeLessThanOrEqual(q[j]!)
      if (Object.is(q[i], q[j])) expect(mz[i]).toBeGreaterThanOrEqual(mz[j]!)
    }
  })

  it('keeps equal ones by their number', () => {
    const sorted = orderFeatures(columns, [{ key: 'verdict', descending: true }])
    for (let row = 1; row < sorted.length; row++) {
      if (columns.verdict[sorted[row - 1]!] === columns.verdict[sorted[row]!]) expect(sorted[row]).toBeGreaterThan(sorted[row - 1]!)
    }
  })
})

describe('filter of features', () => {
  it('leaves out what is in neither side, and only that', () => {
    const bare = manyVerdicts(300, { settings: {} }).result.columns
    const rows = filterFeatures(bare, orderFeatures(bare, [{ key: 'mz', descending: false }]), all)
    expect(rows.length).toBe([...bare.verdict].filter(code => code !== VERDICT.inNeither).length)
  })

  it('keeps the order and passes the chosen verdicts', () => {
    const byMz = orderFeatures(columns, [{ key: 'mz', descending: true }])
    const rows = filterFeatures(columns, byMz, { ...all, verdicts: ['onlyA', 'level'] })
    expect(rows.length).toBe(result.counts.onlyA + result.counts.level)
    expect([...rows]).toEqual([...byMz].filter(i => columns.verdict[i] === VERDICT.onlyA || columns.verdict[i] === VERDICT.level))
  })

  it('passes what every rule passes', () => {
    const rules = [(i: number) => i % 2 === 1, (i: number) => i < 10]
    expect([...filterFeatures(columns, order, { ...all, rules })]).toEqual([1, 3, 5, 7, 9].filter(i => columns.verdict[i] !== VERDICT.inNeither))
    expect(filterFeatures(columns, order, { ...all, rules: [...rules, () => false] })).toHaveLength(0)
  })

  it('gives the same features in another order', () => {
    const byRatio = orderFeatures(columns, [{ key: 'ratio', descending: true }])
    const filter: FeatureFilter = { ...all, verdicts: ['moreA', 'unsettled'] }
    expect(inOrder(filterFeatures(columns, order, filter), byRatio)).toEqual(filterFeatures(columns, byRatio, filter))
  })

  it('knows the row of each feature', () => {
    const rows = filterFeatures(columns, order, { ...all, verdicts: ['moreB'] })
    const place = rowOfFeature(rows, columns.mz.length)
    rows.forEach((feature, row) => expect(place[feature]).toBe(row))
    expect([...place].filter(row => row >= 0)).toHaveLength(rows.length)
  })
})

describe('search of features', () => {
  const finds = (text: string, ppm = 10) => {
    const search = parseSearch(text, ppm)
    return search ? [...order].filter(searchRule(search, columns, i => i === 3 ? 'found only in Millrace' : '')) : null
  }

  it('finds m/z within the tolerance and nothing beyond', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 1999 }), fc.double({ min: 1, max: 50, noNaN: true }), (feature, ppm) => {
      const mz = columns.mz[feature]!
      const found = finds(mz.toFixed(6), ppm) ?? []
      expect(found).toContain(feature)
      for (const other of found) expect(Math.abs(columns.mz[other]! - mz)).toBeLessThanOrEqual(mz * ppm * 1e-6 + 1e-6)
    }))
  })

  it('takes a number with few decimals as all that round to it', () => {
    expect(parseSearch('313,07', 10)).toEqual({ mz: { value: 313.07, tolerance: 0.005 } })
    expect(parseSearch('313', 10)?.mz?.tolerance).toBe(0.5)
  })

  it('reads minutes, both together and a number', () => {
    expect(parseSearch('4.62 min', 10)).toEqual({ minutes: { value: 4.62, tolerance: 0.05 } })
    expect(parseSearch('313.0715 @ 4,6', 10)?.minutes).toEqual({ value: 4.6, tolerance: 0.05 })
    expect(finds('#17')).toEqual([16])
  })

  it('looks for words in reasons and in what is said of a feature', () => {
    const borne = finds('Blank-borne') ?? []
    expect(borne.length).toBeGreaterThan(0)
    expect(finds('only in millrace')).toEqual([3])
    expect(finds('no such words')).toEqual([])
  })

  it('asks nothing where nothing was typed', () => expect(finds('   ')).toBeNull())
})
