import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { activity, samples, studies, tables } from '../../../server/db/schema'
import type { Person } from '../../../server/domain/person/person'
import { editSheet } from '../../../server/domain/sample/editSheet'
import { readSheet } from '../../../server/domain/sample/readSheet'
import { sampleFields, sampleSchema, type SampleField } from '../../../shared/schemas/sample'
import { sheetChangesSchema, type CellValue } from '../../../shared/schemas/sheet'
import type { SampleRow } from '../../../shared/types/sample'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { addTestTable } from '../../support/testTable'

let laboratory: TestLaboratory
let anna: Person
let ben: Person
let studyId: string
const sheet = () => readSheet(laboratory.db, studyId).samples
const row = (name: string): SampleRow => {
  const found = sheet().find(sample => sample.name === name)
  if (!found) throw new Error(`no sample ${name}`)
  return found
}
const save = (changes: object, person = anna, study = studyId) => editSheet(laboratory.db, study, sheetChangesSchema.parse(changes), person)
const edit = (name: string, field: SampleField, from: CellValue, to: CellValue) => ({ sampleId: row(name).id, field, from, to })
const asSeen = (name: string) => ({ sampleId: row(name).id, from: sampleSchema.parse(row(name)) })
const named = (...names: string[]) => names.map((name, index) => ({ key: `new-${index}`, sample: { name } }))

beforeAll(async () => {
  laboratory = await openTestLaboratory()
  anna = addTestPerson(laboratory, 'analyst')
  ben = addTestPerson(laboratory, 'analyst')
})
beforeEach(() => {
  studyId = addTestStudy(laboratory, anna).id
  save({ added: named('one', 'two', 'three') })
})
afterAll(() => laboratory.close())

describe('added rows', () => {
  it('stand at the end in their order, with what is usual where nothing was said', () => {
    const saved = save({ added: [{ key: 'k', sample: { name: ' QC 1 ', kind: 'pooledQc', amount: 12.5, runOrder: 4 } }] })
    expect(saved.samples.map(sample => sample.name)).toEqual(['one', 'two', 'three', 'QC 1'])
    expect(saved.samples.at(-1)).toMatchObject({ id: saved.added.k, kind: 'pooledQc', side: null, amount: 12.5, amountUnit: 'mg', volumeMl: null, runOrder: 4, tables: 0, aligned: false })
  })

  it('are refused alone where their name is taken, in any case', () => {
    const saved = save({ added: named('ONE', 'four', 'Four') })
    expect(saved.refusals).toEqual([
      { row: 'new-0', field: 'name', sentence: 'Another sample of this study has this name.' },
      { row: 'new-2', field: 'name', sentence: 'Another sample of this study has this name.' },
    ])
    expect(saved.samples.map(sample => sample.name)).toEqual(['one', 'two', 'three', 'four'])
    expect(Object.keys(saved.added)).toEqual(['new-1'])
  })

  it('may take the name of a row deleted in the same act', () => {
    const saved = save({ added: named('one'), removed: [asSeen('one')] })
    expect(saved.samples.map(sample => sample.name)).toEqual(['two', 'three', 'one'])
  })

  it('are at most what a sheet may have', () => {
    const many = (from: number) => Array.from({ length: 2000 }, (_, index) => ({ key: `${index}`, sample: { name: `s ${from + index}` } }))
    save({ added: many(0) })
    save({ added: many(2000) })
    expect(() => save({ added: many(4000) })).toThrow('at most 5000 rows')
    expect(sheet()).toHaveLength(4003)
  })
})

describe('edits', () => {
  it('change cells, say who wrote them, touch the study and are logged once', () => {
    laboratory.db.update(studies).set({ lastActivityAt: new Date(0) }).where(eq(studies.id, studyId)).run()
    save({ edits: [edit('one', 'side', null, 'A'), edit('one', 'amount', null, 10.2), edit('two', 'kind', 'sample', 'solventBlank')] }, ben)
    expect(row('one')).toMatchObject({ side: 'A', amount: 10.2, writtenBy: { side: ben.name, amount: ben.name } })
    expect(row('two').kind).toBe('solventBlank')
    expect(laboratory.db.select().from(studies).where(eq(studies.id, studyId)).get()?.lastActivityAt.getTime()).toBeGreaterThan(0)
    expect(laboratory.db.select().from(activity).where(eq(activity.studyId, studyId)).all().at(-1)).toMatchObject({ personId: ben.id, action: 'edit samples', detail: '3 cells of 2 samples changed' })
  })

  it('of two people to different cells of one row are both kept', () => {
    const first = edit('one', 'batch', '', 'monday')
    const second = edit('one', 'preparation', '', 'bottle 1')
    expect(save({ edits: [first] }, anna).conflicts).toEqual([])
    expect(save({ edits: [second] }, ben).conflicts).toEqual([])
    expect(row('one')).toMatchObject({ batch: 'monday', preparation: 'bottle 1' })
  })

  it('to a cell changed meanwhile are not made: both values come back, and by whom', () => {
    const mine = edit('one', 'amount', null, 11)
    const other = edit('two', 'amount', null, 12)
    save({ edits: [edit('one', 'amount', null, 10)] }, ben)
    const saved = save({ edits: [mine, other] }, anna)
    expect(saved.conflicts).toEqual([{ kind: 'cellChanged', sampleId: mine.sampleId, field: 'amount', yours: 11, theirs: 10, byName: ben.name }])
    expect(row('one').amount).toBe(10)
    expect(row('two').amount).toBe(12)
    expect(save({ edits: [{ ...mine, from: 10 }] }, anna).conflicts).toEqual([])
    expect(row('one').amount).toBe(11)
  })

  it('to what stands there already are no conflict', () => {
    const both = edit('one', 'side', null, 'B')
    save({ edits: [both] }, ben)
    expect(save({ edits: [both] }, anna).conflicts).toEqual([])
  })

  it('to a row deleted meanwhile come back', () => {
    const mine = edit('one', 'side', null, 'A')
    save({ removed: [asSeen('one')] }, ben)
    expect(save({ edits: [mine] }, anna).conflicts).toEqual([{ kind: 'rowGone', sampleId: mine.sampleId, field: 'side', yours: 'A' }])
  })

  it('may swap two names, and may change the case of one', () => {
    const saved = save({ edits: [edit('one', 'name', 'one', 'two'), edit('two', 'name', 'two', 'one'), edit('three', 'name', 'three', 'Three')] })
    expect(saved.refusals).toEqual([])
    expect(saved.samples.map(sample => sample.name)).toEqual(['two', 'one', 'Three'])
  })

  it('to a taken name are refused, and so is who counted on the name that stays', () => {
    const [one, two] = [row('one'), row('two')]
    const saved = save({ edits: [
      edit('one', 'name', 'one', 'two'), edit('one', 'side', null, 'A'),
      edit('two', 'name', 'two', 'THREE'),
    ] })
    expect(saved.refusals.map(refusal => refusal.row).sort()).toEqual([one.id, two.id].sort())
    expect(saved.samples.map(sample => sample.name)).toEqual(['one', 'two', 'three'])
    expect(row('one').side).toBe('A')
  })

  it('never reach another study', () => {
    const elsewhere = addTestStudy(laboratory, anna).id
    const attack = { edits: [edit('one', 'name', 'one', 'stolen')], removed: [asSeen('two')] }
    const saved = save(attack, anna, elsewhere)
    expect(saved.conflicts.map(conflict => conflict.kind)).toEqual(['rowGone'])
    expect(sheet().map(sample => sample.name)).toEqual(['one', 'two', 'three'])
  })

  it('are refused as a whole where one can\'t be read, naming it', () => {
    const result = sheetChangesSchema.safeParse({ edits: [edit('one', 'amount', null, -1), edit('one', 'side', null, 'C'), edit('one', 'name', 'one', ''), edit('one', 'injectionUl', null, 1e-300)] })
    expect(result.error?.issues.map(issue => [issue.path.join('.'), issue.message])).toEqual([
      ['edits.0.to', 'Must be greater than 0.'], ['edits.1.to', 'A, B or empty.'], ['edits.2.to', 'A sample needs a name.'], ['edits.3.to', 'Too small.'],
    ])
  })

  it('read one sheet where every field is a column', () => {
    expect([...sampleFields].sort()).toEqual(Object.keys(sampleSchema.shape).sort())
  })
})

describe('deleted rows', () => {
  it('go, unless someone changed them meanwhile', () => {
    const seen = asSeen('one')
    save({ edits: [edit('one', 'batch', '', 'b2')] }, ben)
    const saved = save({ removed: [seen, asSeen('two')] }, anna)
    expect(saved.conflicts).toEqual([{ kind: 'rowChanged', sampleId: seen.sampleId }])
    expect(saved.samples.map(sample => sample.name)).toEqual(['one', 'three'])
  })

  it('are no matter when they are gone already', () => {
    const seen = asSeen('one')
    save({ removed: [seen] }, ben)
    expect(save({ removed: [seen] }, anna)).toMatchObject({ conflicts: [], refusals: [] })
    expect(laboratory.db.select().from(samples).where(eq(samples.studyId, studyId)).all()).toHaveLength(2)
  })

  it('leave their tables without a sample', () => {
    const table = addTestTable(laboratory, studyId, anna.id, { mz: [200], minutes: [1], intensity: [1e5] }, { name: 'four' })
    expect(row('four')).toMatchObject({ tables: 1, aligned: false })
    save({ removed: [asSeen('four')] })
    expect(laboratory.db.select({ sampleId: tables.sampleId }).from(tables).where(eq(tables.id, table.id)).get()).toEqual({ sampleId: null })
  })

  it('stay where an alignment holds them, with a sentence', () => {
    addComparedAlignment(laboratory, studyId, anna.id, [{ name: 'aligned', intensity: [1e5] }])
    expect(row('aligned')).toMatchObject({ tables: 1, aligned: true })
    const saved = save({ removed: [asSeen('aligned'), asSeen('two')] })
    expect(saved.refusals).toEqual([{ row: row('aligned').id, field: null, sentence: 'aligned stands in an alignment and can\'t be deleted. Take its side away to leave it out of new comparisons.' }])
    expect(saved.samples.map(sample => sample.name).sort()).toEqual(['aligned', 'one', 'three'])
  })
})
