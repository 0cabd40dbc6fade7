import { describe, expect, it } from 'vitest'
import { exportNotes, shownFileName, type ShownState } from '../../../app/utils/exportNotes'
import { DEFAULT_LAYOUT } from '../../../app/utils/columnLayout'
import { chosenColumns, featureColumns, fullValue, type ColumnSources } from '../../../app/utils/featureColumns'
import { ionFitsAsked } from '../../../app/utils/featureRules'
import { csvRows, tabbedRows } from '../../../app/utils/shownRows'
import { manyVerdicts } from '../../support/manyFeatures'

const many = manyVerdicts(400)
const { columns: c } = many.result
const sources: ColumnSources = {
  result: many.result, foldLimit: 1, names: { a: '=Millrace', b: 'Tallow Lane' }, masses: { polarity: 'negative', massKind: 'mz' }, asked: [],
  flags: new Map([[4, [{ id: 'f', featureIndex: 4, kind: 'artefact', reason: '-1 and\ttab', by: 'A person', at: '2026-01-01T00:00:00.000Z' }]]]),
}
const all = featureColumns(sources)
const pick = (...ids: string[]) => ids.flatMap(id => all.find(column => column.id === id) ?? [])

describe('the columns of the feature table', () => {
  it('never print what is no number', () => {
    for (const column of all) for (let i = 0; i < 400; i++) expect(column.cell(i)).not.toMatch(/NaN|Infinity|undefined|null/)
  })

  it('have titles that differ', () => expect(new Set(all.map(({ title }) => title)).size).toBe(all.length))

  it('give the neutral mass as of the plain ion of the polarity, and say which', () => {
    const mass = (masses: ColumnSources['masses']) => featureColumns({ ...sources, masses }).find(({ id }) => id === 'mass')
    expect(mass(sources.masses)?.title).toBe('neutral mass if [M−H]⁻ (u)')
    expect(mass(sources.masses)?.exact(0)).toBeCloseTo(c.mz[0]! + 1.00727646, 6)
    expect(mass({ polarity: 'positive', massKind: 'mz' })?.exact(0)).toBeCloseTo(c.mz[0]! - 1.00727646, 6)
    expect(mass({ polarity: 'positive', massKind: 'neutral' })?.exact(0)).toBe(c.mz[0])
  })

  it('stand as chosen, with what is looked for by its ions behind the frozen ones', () => {
    const asked = ionFitsAsked({ formula: { formula: 'C21H24O10', ppm: 5 }, massNear: null }, sources.masses)
    const chosen = chosenColumns(all, DEFAULT_LAYOUT.shown, 3, { ...sources, asked, result: { ...many.result, columns: { ...c, mz: Float64Array.of(435.1297, 300) } } })
    expect(chosen.map(({ id }) => id).slice(0, 5)).toEqual(['flags', 'number', 'mz', 'fit', 'minutes'])
    expect(chosen[3]?.cell(0)).toBe('[M−H]⁻ +0.1 ppm')
    expect(chosen[3]?.cell(1)).toBe('–')
    const below = chosenColumns(all, ['mz'], 1, { asked, result: { ...many.result, columns: { ...c, mz: Float64Array.of(435.12966) } } })
    expect(below[1]?.cell(0)).toBe('[M−H]⁻ 0.0 ppm')
  })

  it('say in full on hover what a cell shortens', () => {
    const [mz, verdict] = pick('mz', 'verdict')
    expect(mz && fullValue(mz, 0, sources.names)).toBe(String(c.mz[0]))
    expect(verdict && fullValue(verdict, 0, sources.names)).toBe(verdict?.cell(0))
  })
})

describe('rows for a spreadsheet', () => {
  it('have a head, full numbers, empty cells for none, and guarded text', () => {
    const one = [...c.verdict].findIndex((_, i) => Number.isNaN(c.q[i]))
    const lines = tabbedRows(pick('number', 'mz', 'q', 'flags', 'foundA'), [4, one]).split('\n')
    expect(lines[0]).toBe('feature\tm/z\tq\tflags\tpreparations found of 3, =Millrace')
    expect(lines[1]?.startsWith(`5\t${c.mz[4]}\t`)).toBe(true)
    expect(lines[1]).toContain('"artefact: -1 and\ttab"')
    expect(lines[2]).toBe(`${one + 1}\t${c.mz[one]}\t\t\t${c.detectedA[one]}`)
    const only = [...c.verdict].indexOf(1)
    expect(tabbedRows(pick('verdict', 'ratio'), [only]).split('\n')[1]).toMatch(/^found only in =Millrace\t/)
  })

  it('guards text that would run, and never a number', () => {
    const ratio = [...c.log2Ratio].findIndex(value => value < 0)
    const column = { ...all[0]!, exact: () => '=1+1' }
    expect(tabbedRows([column, ...pick('ratio')], [ratio]).split('\n')[1]).toBe(`'=1+1\t${c.log2Ratio[ratio]}`)
  })
})

describe('the CSV of what is shown', () => {
  const state: ShownState = {
    source: { title: 'Äpfel & Birnen: 1/2', version: { number: 3, sideAName: 'Millrace', sideBName: 'Tallow Lane', engineVersion: '7' } as ShownState['source']['version'], exportNotes: () => ['Table of M1: m1.csv, SHA-256 abc'] },
    settings: many.settings, isPreview: true, cautions: ['Few replicates.'], filters: [{ words: 'q at most 0.05', without: {} }], sort: [{ key: 'reach', descending: true }, { key: 'mz', descending: false }], shown: 2, total: 400,
  }

  it('says above what it is made from', () => {
    const lines = csvRows(pick('number', 'mz'), [7, 3], exportNotes(state)).split('\r\n')
    for (const note of ['Filter: q at most 0.05', 'Order: reach descending, then mz ascending', 'Preview under other limits', 'Engine version 7', 'SHA-256 abc', 'Fold limit: ×2', 'Caution: Few replicates.']) expect(lines.some(line => line.includes(note))).toBe(true)
    expect(lines[0]).toContain('2 of 400 features of “Äpfel & Birnen: 1/2”, version 3')
    expect(lines.slice(-4)).toEqual(['feature,m/z', `8,${c.mz[7]}`, `4,${c.mz[3]}`, ''])
  })

  it('is called after comparison and version', () => {
    expect(shownFileName(state.source)).toBe('steelyard-apfel-birnen-1-2-version-3-shown.csv')
    expect(shownFileName({ ...state.source, title: '¿?' })).toBe('steelyard-comparison-version-3-shown.csv')
  })
})
