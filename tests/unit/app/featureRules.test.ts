import { describe, expect, it } from 'vitest'
import { initialView, type BenchView } from '../../../app/utils/benchView'
import { filterFeatures } from '../../../app/utils/featureFilter'
import { orderFeatures } from '../../../app/utils/featureOrder'
import { filterRules, ionFitsAsked } from '../../../app/utils/featureRules'
import { filterWords } from '../../../app/utils/filterWords'
import { readRange, rangeWords, writeRange } from '../../../app/utils/numberRange'
import { massOfFormula } from '../../../app/utils/massTarget'
import type { Masses } from '../../../shared/science/mass/ionFits'
import { manyVerdicts } from '../../support/manyFeatures'

const { columns } = manyVerdicts(3000).result
const negative: Masses = { polarity: 'negative', massKind: 'mz' }
const order = orderFeatures(columns, [])
const found = (part: Partial<BenchView>, masses = negative) => [...filterFeatures(columns, order, {
  verdicts: [], rules: filterRules({ ...initialView(), ...part }, { columns, masses, flagged: new Set([7, 11]), said: i => i === 5 ? 'found only in Millrace' : '' }),
})]
const expected = (passes: (i: number) => boolean) => found({}).filter(passes)

describe('filters of the bench', () => {
  it('ask nothing as the bench opens', () => expect(found({})).toHaveLength(filterFeatures(columns, order, { verdicts: [], rules: [] }).length))

  it.each([
    ['minutes', { minutes: { from: 3, to: 5 } }, (i: number) => columns.retentionMinutes[i]! >= 3 && columns.retentionMinutes[i]! <= 5],
    ['m/z from', { mzRange: { from: 500, to: null } }, (i: number) => columns.mz[i]! >= 500],
    ['log2 ratio', { ratio: { from: null, to: -1 } }, (i: number) => columns.log2Ratio[i]! <= -1],
    ['ratio either way', { fold: { from: 2, to: null } }, (i: number) => Math.abs(columns.log2Ratio[i]!) >= 1],
    ['q', { q: { from: null, to: 0.05 } }, (i: number) => columns.q[i]! <= 0.05],
    ['reach', { reach: { from: 3, to: 50 } }, (i: number) => columns.reach[i]! >= 3 && columns.reach[i]! <= 50],
    ['highest counts', { intensity: { from: 1e5, to: null } }, (i: number) => columns.highestCounts[i]! >= 1e5],
    ['flags', { flags: 'flagged' as const }, (i: number) => i === 7 || i === 11],
    ['words', { find: 'millrace' }, (i: number) => i === 5],
  ])('%s', (_, part, passes) => {
    const rows = found(part)
    expect(rows).toEqual(expected(passes))
    expect(rows.length).toBeGreaterThan(0)
    expect(rows.length).toBeLessThan(found({}).length)
  })

  it('hold together', () => {
    const both = { minutes: { from: 3, to: 9 }, q: { from: null, to: 0.5 } }
    expect(found(both)).toEqual(found({ minutes: both.minutes }).filter(i => found({ q: both.q }).includes(i)))
  })

  it('take an m/z within its ppm', () => {
    const [mz, i] = [columns.mz[40]!, 40]
    expect(found({ mzNear: { value: mz * (1 + 4e-6), ppm: 5 } })).toContain(i)
    expect(found({ mzNear: { value: mz * (1 + 6e-6), ppm: 5 } })).not.toContain(i)
  })

  it('take the neutral mass and the formula by usual ions of the polarity', () => {
    const deprotonated = columns.mz[40]! + 1.00727646
    expect(found({ massNear: { value: deprotonated, ppm: 5 } })).toContain(40)
    expect(found({ massNear: { value: deprotonated, ppm: 5 } }, { polarity: 'positive', massKind: 'mz' })).not.toContain(40)
    expect(found({ massNear: { value: columns.mz[40]!, ppm: 5 } }, { polarity: 'positive', massKind: 'neutral' })).toContain(40)
  })

  it('say which ion fits a formula, and how well', () => {
    const [asked] = ionFitsAsked({ formula: { formula: 'C21H24O10', ppm: 5 }, massNear: null }, negative)
    expect(asked?.what).toBe('C21H24O10')
    // [M−H]⁻ of phloridzin, C21H24O10, as in tests/reference/data/masses.json.
    expect(asked?.of(435.1297)?.adduct).toBe('[M-H]-')
    expect(Math.abs(asked?.of(435.1297)?.errorPpm ?? 99)).toBeLessThan(0.5)
    expect(asked?.of(435.1335)).toBeNull()
  })
})

describe('filters in words', () => {
  it('give each filter that stands, with what takes it away', () => {
    const view: BenchView = { ...initialView(), verdicts: ['onlyA', 'level'], flags: 'artefact', find: ' 313 ', mzNear: { value: 313.07, ppm: 10 }, formula: { formula: 'C21H24O10', ppm: 5 }, ratio: { from: -3, to: null }, q: { from: null, to: 0.05 } }
    const words = filterWords(view, 1, { a: 'Millrace', b: 'Tallow Lane' })
    expect(words.map(each => each.words)).toEqual([
      'found only in Millrace', 'level within ×2', 'flag: artefact', 'found by “313” (m/z within 10 ppm)', 'm/z 313.07 ± 10 ppm',
      'fits an ion of C21H24O10 within 5 ppm: not an identification', 'log2 B/A at least −3', 'q at most 0.05',
    ])
    expect(words[0]?.without).toEqual({ verdicts: ['level'] })
    expect(filterWords(words.reduce((left, { without }) => ({ ...left, ...without, verdicts: [] }), view), 1, { a: 'A', b: 'B' })).toEqual([])
  })
})

describe('ranges and formulas', () => {
  it('reads only what is a range', () => {
    for (const text of ['1~2', '~0.05', '3~', '-2~-1']) expect(writeRange(readRange(text) ?? { from: null, to: null })).toBe(text)
    for (const text of ['', '~', '1', '1~2~3', 'a~2', '1~Infinity']) expect(readRange(text)).toBeUndefined()
    expect(rangeWords({ from: 1, to: 2 })).toBe('from 1 to 2')
  })

  it('says what is wrong with a formula', () => {
    expect(massOfFormula('C6H12O6')).toBeCloseTo(180.06339, 4)
    for (const text of ['', 'hello', 'C6H12O6)', 'C'.repeat(80), 'C99999999']) expect(massOfFormula(text)).toMatch(/\.$/)
  })
})
