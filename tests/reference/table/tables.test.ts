import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { readTable } from '../../../shared/formats/delimitedText/readTable'
import { surveyTable } from '../../../shared/formats/delimitedText/surveyTable'
import { proposeLayout } from '../../../shared/science/table/proposeLayout'
import { TableRefused } from '../../../shared/science/table/tableRefused'

/** Answers written by make-tables.py beside the files, apart from this program. */
interface Expected {
  rows?: number
  first?: [number, number, number]
  warn?: string
  ask?: string
  refuse?: string
  measure?: string
  refused?: { line: number, column: string }[]
  samples?: Record<string, number>
}

const folder = fileURLToPath(new URL('../data/tables/', import.meta.url))
const { files } = JSON.parse(readFileSync(`${folder}expected.json`, 'utf8')) as { files: Record<string, Expected> }

/** A file in pieces of a size that cuts lines, cells and characters in two. */
function open(name: string, size: number) {
  const bytes = readFileSync(folder + name)
  return async function* () {
    for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size)
  }
}

describe.each([7, 65_536])('every shape of export, read in pieces of %i bytes', (size) => {
  it.each(Object.entries(files).filter(([, expected]) => expected.refuse !== undefined))('%s is refused', async (name) => {
    const survey = await surveyTable(open(name, size)).catch((error: unknown) => error)
    if (survey instanceof Error) expect(survey).toBeInstanceOf(TableRefused)
    else expect(proposeLayout(survey as Awaited<ReturnType<typeof surveyTable>>).refuse).toMatch(/no rows/)
  })

  it.each(Object.entries(files).filter(([, expected]) => expected.ask !== undefined))('%s waits for an answer', async (name, expected) => {
    const proposal = proposeLayout(await surveyTable(open(name, size)))
    expect(proposal.refuse).toBeNull()
    expect(proposal.layout).toBeNull()
    expect(proposal.questions.map(question => question.field)).toEqual([expected.ask?.includes('m/z column') ? 'mzColumn' : 'intensityDecimalMark'])
  })

  it.each(Object.entries(files).filter(([, expected]) => expected.first !== undefined))('%s gives its rows', async (name, expected) => {
    const proposal = proposeLayout(await surveyTable(open(name, size)))
    expect(proposal.questions).toEqual([])
    expect(proposal.confirmations.map(question => question.field)).toEqual(expected.warn === undefined ? [] : [expected.warn.includes('seconds') ? 'timeUnit' : 'massKind'])
    if (proposal.layout === null) throw new Error('no layout')
    if (expected.measure !== undefined) expect(proposal.layout.measure).toBe(expected.measure)
    const built = await readTable(open(name, size)(), proposal.layout)
    expect(built.rowsRead).toBe(expected.rows)
    expect(built.refused.map(({ line, column }) => ({ line, column }))).toEqual(expected.refused ?? [])
    expect(built.refused.every(refused => refused.reason !== '')).toBe(true)
    const columns = built.samples[0]?.take()
    expect(columns?.mz.length).toBe(expected.rows)
    expect(columns?.mz[0]).toBe(expected.first?.[0])
    expect(columns?.minutes[0]).toBeCloseTo(expected.first?.[1] ?? Number.NaN, 6)
    expect(columns?.intensity[0]).toBe(expected.first?.[2])
  })

  it.each(Object.entries(files).filter(([, expected]) => expected.samples !== undefined))('%s gives a table a sample', async (name, expected) => {
    const proposal = proposeLayout(await surveyTable(open(name, size)))
    expect([...proposal.questions, ...proposal.confirmations]).toEqual([])
    if (proposal.layout === null) throw new Error('no layout')
    const built = await readTable(open(name, size)(), proposal.layout)
    expect(Object.fromEntries(built.samples.map(sample => [sample.name, sample.features]))).toEqual(expected.samples)
    expect(built.refused).toEqual([])
  })
})

it('leaves no file of the folder without an expectation', () => {
  expect(Object.values(files).every(expected => [expected.first, expected.ask, expected.refuse, expected.samples].filter(one => one !== undefined).length === 1)).toBe(true)
})

it('reads the Latin alphabet of "m/z" headers and the values of one file the same in every encoding it comes in', async () => {
  const read = async (name: string) => {
    const { layout } = proposeLayout(await surveyTable(open(name, 4096)))
    if (layout === null) throw new Error('no layout')
    return (await readTable(open(name, 4096)(), layout)).samples[0]?.take()
  }
  expect(await read('utf16-bom.txt')).toEqual(await read('plain.csv'))
})
