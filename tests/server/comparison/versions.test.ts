import { gunzipSync } from 'node:zlib'
import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { activity, comparisonVersions, jobs, samples, tables } from '../../../server/db/schema'
import { readComparisonData } from '../../../server/domain/comparison/comparisonData'
import { listComparisons } from '../../../server/domain/comparison/listComparisons'
import { prepareComparison, prepareVersion } from '../../../server/domain/comparison/prepareComparison'
import { readComparison } from '../../../server/domain/comparison/readComparison'
import { versionColumns } from '../../../server/domain/comparison/readVersion'
import type { CompareInput } from '../../../server/domain/comparison/compareInput'
import type { Person } from '../../../server/domain/person/person'
import type { VisibleStudy } from '../../../server/domain/study/findVisibleStudy'
import { unpackComparisonData } from '../../../shared/formats/comparisonData'
import { packVerdicts, unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { newComparisonSchema, newVersionSchema, type NewVersionInput } from '../../../shared/schemas/comparison'
import { decideVerdicts } from '../../../shared/science/verdict/decideVerdicts'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { summariseSides } from '../../../shared/science/verdict/summariseSides'
import { VERDICTS } from '../../../shared/science/verdict/verdicts'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { none } from '../../support/comparisonInput'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let analyst: Person
let student: Person
let study: VisibleStudy
let alignmentId: string
let sampleIds: string[]

beforeAll(async () => {
  laboratory = await openTestLaboratory(['compare'])
  analyst = addTestPerson(laboratory, 'analyst')
  student = addTestPerson(laboratory, 'student')
  study = addTestStudy(laboratory, analyst)
  const made = addComparedAlignment(laboratory, study.id, analyst.id, [
    { name: 'a1', side: 'A', intensity: [1000, 5000, none, 20] },
    { name: 'b1', side: 'B', intensity: [1100, none, 800, 25], statedFloor: 100 },
    { name: 'extra', side: null, intensity: [1000, 900, 800, 30] },
    { name: 'blank', side: null, kind: 'solventBlank', intensity: [none, none, none, 20] },
  ])
  alignmentId = made.alignment.id
  sampleIds = made.placed.map(({ sampleId }) => sampleId)
})
afterAll(() => laboratory.close())

/** Runs a comparing job to its end and gives the comparison's id. */
async function run(input: CompareInput, person = analyst): Promise<string> {
  const job = laboratory.jobs.add({ kind: 'compare', studyId: study.id, input, personId: person.id })
  await laboratory.jobs.idle()
  const ended = laboratory.db.select().from(jobs).where(eq(jobs.id, job.id)).get()
  if (ended?.status !== 'done' || !ended.resultId) throw new Error(ended?.message)
  return ended.resultId
}
const create = (input: object = {}, person = analyst) => run(prepareComparison(laboratory.db, study, newComparisonSchema.parse({ alignmentId, ...input }), person), person)
const version = (input: Partial<NewVersionInput> = {}): NewVersionInput => newVersionSchema.parse({ from: 1, settings: comparisonDefaults, ...input })
const save = (id: string, input: Partial<NewVersionInput>, person = analyst) => run(prepareVersion(laboratory.db, study, id, version(input), person), person)
const read = (id: string, number?: number, person = analyst) => readComparison(laboratory.db, study.id, id, person, number)
const result = (id: string, number?: number) => unpackVerdicts(gunzipSync(versionColumns(laboratory.db, read(id, number).version.id)))
const verdicts = (id: string, number?: number) => [...result(id, number).columns.verdict].map(code => VERDICTS[code])

describe('a new comparison', () => {
  it('takes sides from the sample sheet, and estimates floors that nobody stated', async () => {
    const id = await create()
    const { version: first, title, practice, mayChange } = read(id)
    expect({ title, practice, mayChange, number: first.number }).toEqual({ title: 'A against B', practice: false, mayChange: true, number: 1 })
    expect(first.samples.map(({ name, side, floor, floorSource }) => ({ name, side, floor, floorSource }))).toEqual([
      { name: 'a1', side: 'A', floor: 20, floorSource: 'estimated' },
      { name: 'b1', side: 'B', floor: 100, floorSource: 'stated' },
      { name: 'extra', side: null, floor: 30, floorSource: 'estimated' },
      { name: 'blank', side: null, floor: 20, floorSource: 'estimated' },
    ])
    expect({ polarity: first.polarity, massKind: first.massKind, alignMassPpm: first.alignMassPpm }).toEqual({ polarity: 'negative', massKind: 'mz', alignMassPpm: 10 })
    expect(verdicts(id)).toEqual(['level', 'onlyA', 'onlyB', 'setAside'])
    expect(first.counts).toMatchObject({ level: 1, onlyA: 1, onlyB: 1, setAside: 1, inNeither: 0 })
    expect(first.cautions.join(' ')).toContain('Assumed precision')
    expect(first.tables.map(table => table.fileName)).toEqual(['a1.csv', 'b1.csv', 'extra.csv', 'blank.csv'])
    expect(laboratory.db.select().from(activity).where(eq(activity.subjectId, id)).all().map(act => act.action)).toEqual(['make comparison'])
  })

  it('keeps exactly what the page\'s own preview computes from its input', async () => {
    const id = await create()
    const data = unpackComparisonData(readComparisonData(laboratory.db, study.id, id, analyst))
    const { settings } = read(id).version
    const preview = decideVerdicts(summariseSides({ ...data, normaliseByAmount: settings.normaliseByAmount }), settings)
    expect(packVerdicts(preview)).toEqual(new Uint8Array(gunzipSync(versionColumns(laboratory.db, read(id).version.id))))
  })

  it('takes sides by hand, and says where that is', async () => {
    const id = await create({ sides: { [sampleIds[1] ?? '']: null, [sampleIds[2] ?? '']: 'B' }, sideAName: 'Millrace', sideBName: 'Tallow Lane' })
    expect(read(id).title).toBe('Millrace against Tallow Lane')
    expect(read(id).version.samples.map(({ name, side, sideByHand }) => [name, side, sideByHand])).toEqual([
      ['a1', 'A', undefined], ['b1', null, true], ['extra', 'B', true], ['blank', null, undefined],
    ])
    expect(read(id).version.sheetChanges).toEqual([])
  })

  it('is refused at once, with a sentence, where a side is empty', () => {
    const input = newComparisonSchema.parse({ alignmentId, sides: { [sampleIds[1] ?? '']: null } })
    expect(() => prepareComparison(laboratory.db, study, input, analyst)).toThrow('Side B has no sample to compare')
  })

  it('is not made on an alignment of another study', () => {
    const other = addTestStudy(laboratory, analyst)
    expect(() => prepareComparison(laboratory.db, other, newComparisonSchema.parse({ alignmentId }), analyst)).toThrow('nothing at this address')
  })
})

describe('a new version', () => {
  it('leaves the old one as it was, byte for byte, and says what differs', async () => {
    const id = await create()
    const before = laboratory.db.select().from(comparisonVersions).where(eq(comparisonVersions.comparisonId, id)).get()
    await save(id, { settings: { ...comparisonDefaults, reachLimit: 60, blankRatio: 1 } })
    expect(laboratory.db.select().from(comparisonVersions).where(eq(comparisonVersions.comparisonId, id)).all()[0]).toEqual(before)
    expect(verdicts(id)).toEqual(['level', 'unsettled', 'unsettled', 'level'])
    expect(verdicts(id, 1)).toEqual(['level', 'onlyA', 'onlyB', 'setAside'])
    expect(read(id).version.differs).toEqual(['Blank ratio: ×5 → ×1.', 'Reach limit: ×3 → ×60.'])
    expect(read(id).versions.map(line => line.number)).toEqual([1, 2])
    expect(() => laboratory.db.update(comparisonVersions).set({ sideAName: 'changed' }).run()).toThrow('never changed')
  })

  it('is not saved where nothing differs', async () => {
    const id = await create()
    expect(() => prepareVersion(laboratory.db, study, id, version(), analyst)).toThrow('Nothing differs from version 1')
  })

  it('may go back to an older one', async () => {
    const id = await create()
    await save(id, { settings: { ...comparisonDefaults, reachLimit: 60 } })
    await save(id, { from: 1 })
    expect(read(id).version.differs).toEqual(['Reach limit: ×60 → ×3.'])
    expect(read(id).version.number).toBe(3)
  })

  it('forgets features set aside by hand on another alignment: they would be others', async () => {
    const { alignment } = addComparedAlignment(laboratory, study.id, analyst.id, [{ name: 'a9', side: 'A', intensity: [1000] }, { name: 'b9', side: 'B', intensity: [1000] }])
    const id = await create({ settings: { setAsideByHand: [{ index: 0, reason: 'bleed' }] } })
    expect(verdicts(id)[0]).toBe('setAside')
    await save(id, { settings: read(id).version.settings, alignmentId: alignment.id })
    expect(verdicts(id)).toEqual(['level'])
    expect(read(id).version.settings.setAsideByHand).toEqual([])
    expect(read(id).version.differs).toContain('a9 is new.')
  })
})

describe('when the sample sheet changes afterwards', () => {
  it('saved numbers stay, the change is told, and a new version takes it', async () => {
    const id = await create()
    const [first = ''] = sampleIds
    laboratory.db.update(samples).set({ amount: 50 }).where(eq(samples.id, first)).run()
    expect(read(id).version.sheetChanges).toEqual(['a1: amount 100 mg → 50 mg.'])
    expect(verdicts(id)[0]).toBe('level')

    await save(id, { settings: { ...comparisonDefaults, reachLimit: 4 } })
    expect(read(id).version.samples[0]?.amount).toBe(100)
    await save(id, { from: 2, settings: { ...comparisonDefaults, reachLimit: 4 }, useSheet: true })
    expect(read(id).version.samples[0]?.amount).toBe(50)
    expect(read(id).version.sheetChanges).toEqual([])
    expect(read(id).version.differs).toEqual(['a1: amount 100 mg → 50 mg.'])
    expect(read(id, 1).version.sheetChanges).toEqual(['a1: amount 100 mg → 50 mg.'])
    laboratory.db.update(samples).set({ amount: 100 }).where(eq(samples.id, first)).run()
  })

  it('tells of a side, a stated limit and a replaced table too, and takes a side by hand as meant', async () => {
    const id = await create({ sides: { [sampleIds[2] ?? '']: 'A' } })
    const { db } = laboratory
    db.update(samples).set({ side: null }).where(eq(samples.id, sampleIds[1] ?? '')).run()
    db.update(samples).set({ side: 'B' }).where(eq(samples.id, sampleIds[2] ?? '')).run()
    db.update(tables).set({ statedFloor: 70, replacedAt: new Date() }).where(eq(tables.sampleId, sampleIds[0] ?? '')).run()
    expect(read(id).version.sheetChanges).toEqual([
      'a1: peak limit not stated → 70.', 'b1: side B → none.', 'The table of a1 was replaced since. Align anew to use the new one.',
    ])
    db.update(samples).set({ side: 'B' }).where(eq(samples.id, sampleIds[1] ?? '')).run()
    db.update(samples).set({ side: null }).where(eq(samples.id, sampleIds[2] ?? '')).run()
    db.update(tables).set({ statedFloor: null, replacedAt: null }).where(eq(tables.sampleId, sampleIds[0] ?? '')).run()
  })

  it('tells of a sample that was taken off', async () => {
    const made = addComparedAlignment(laboratory, study.id, analyst.id, [{ name: 'a7', side: 'A', intensity: [1000] }, { name: 'b7', side: 'B', intensity: [1000] }])
    const id = await create({ alignmentId: made.alignment.id })
    laboratory.db.delete(samples).where(eq(samples.id, made.placed[0]?.sampleId ?? '')).run()
    expect(read(id).version.sheetChanges).toEqual(['a7 is no longer there.'])
    expect(verdicts(id)).toEqual(['level'])
  })
})

describe('practice copies', () => {
  it('are made by a student on an official alignment, and seen by them alone', async () => {
    const id = await create({ practice: true, title: 'My try' }, student)
    expect(read(id, undefined, student)).toMatchObject({ practice: true, mayChange: true, title: 'My try' })
    expect(() => read(id)).toThrow('nothing at this address')
    expect(() => readComparisonData(laboratory.db, study.id, id, analyst)).toThrow('nothing at this address')
    expect(() => prepareVersion(laboratory.db, study, id, version(), analyst)).toThrow('nothing at this address')
    expect(listComparisons(laboratory.db, study.id, student).map(line => line.id)).toContain(id)
    expect(listComparisons(laboratory.db, study.id, analyst).map(line => line.id)).not.toContain(id)
    await save(id, { settings: { ...comparisonDefaults, foldLimit: 2 } }, student)
    expect(read(id, undefined, student).version.number).toBe(2)
  })

  it('follow from a practice alignment, which nobody else may compare on', async () => {
    const { alignment } = addComparedAlignment(laboratory, study.id, student.id, [{ name: 'a8', side: 'A', intensity: [1000] }, { name: 'b8', side: 'B', intensity: [1000] }], { practice: true })
    const id = await create({ alignmentId: alignment.id }, student)
    expect(read(id, undefined, student).practice).toBe(true)
    expect(() => prepareComparison(laboratory.db, study, newComparisonSchema.parse({ alignmentId: alignment.id }), analyst)).toThrow('nothing at this address')
  })

  it('are all that a student may make', async () => {
    expect(() => prepareComparison(laboratory.db, study, newComparisonSchema.parse({ alignmentId }), student)).toThrow('practice copies only')
    const id = await create()
    expect(read(id, undefined, student).mayChange).toBe(false)
    expect(() => prepareVersion(laboratory.db, study, id, version(), student)).toThrow('practice copies only')
  })

  it('never let an official comparison rest on a practice alignment', async () => {
    const { alignment } = addComparedAlignment(laboratory, study.id, analyst.id, [{ name: 'a6', side: 'A', intensity: [1000] }, { name: 'b6', side: 'B', intensity: [1000] }], { practice: true })
    const id = await create()
    expect(() => prepareVersion(laboratory.db, study, id, version({ alignmentId: alignment.id }), analyst)).toThrow('can\'t rest on a practice alignment')
  })
})

describe('the list', () => {
  it('has the newest first, each with its latest version', async () => {
    const id = await create({ title: 'The newest' })
    await save(id, { settings: { ...comparisonDefaults, alpha: 0.01 } })
    const [line] = listComparisons(laboratory.db, study.id, analyst)
    expect(line).toMatchObject({ id, title: 'The newest', versions: 2, createdByName: analyst.name, latest: { number: 2, differs: ['Alpha: 0.05 → 0.01.'] } })
  })
})
