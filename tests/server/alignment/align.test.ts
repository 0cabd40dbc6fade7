import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { unpackFloat64, unpackInt32 } from '../../../server/db/packed'
import { activity, alignments, alignmentTables, jobs, samples, tables } from '../../../server/db/schema'
import { listAlignments } from '../../../server/domain/alignment/listAlignments'
import { matrixCsv } from '../../../server/domain/alignment/matrixCsv'
import { planAlignment } from '../../../server/domain/alignment/planAlignment'
import { readAlignment } from '../../../server/domain/alignment/readAlignment'
import type { Person } from '../../../server/domain/person/person'
import { readColumn } from '../../../server/domain/table/tableColumns'
import { newAlignmentSchema, type NewAlignment } from '../../../shared/schemas/alignment'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { simulate } from '../../support/simulate'
import { addTestTable } from '../../support/testTable'

let open: TestLaboratory
let analyst: Person
let study: ReturnType<typeof addTestStudy>

beforeEach(async () => {
  open = await openTestLaboratory(['align'])
  analyst = addTestPerson(open, 'analyst')
  study = addTestStudy(open, analyst)
})
afterEach(() => open.close())

const small = { mz: [100.01, 200.02, 300.03], minutes: [1, 2, 3], intensity: [1000, 2000, 3000] }

function addTwoTables() {
  addTestTable(open, study.id, analyst.id, small, { name: 'one' })
  addTestTable(open, study.id, analyst.id, { mz: [100.0101, 200.0202, 400.04], minutes: [1.01, 2.01, 4], intensity: [1100, 2100, 4100] }, { name: '=two' })
}
async function run(input: Partial<NewAlignment> = {}, person = analyst) {
  const plan = planAlignment(open.db, study.id, newAlignmentSchema.parse({ settings: {}, ...input }), person)
  const { id } = open.jobs.add({ kind: 'align', studyId: study.id, input: plan, personId: person.id })
  await open.jobs.idle()
  const job = open.db.select().from(jobs).where(eq(jobs.id, id)).get()
  expect(job).toMatchObject({ status: 'done' })
  return job?.resultId ?? ''
}

describe('an alignment', () => {
  it('keeps groups, members, corrected times, left-out features and drift', async () => {
    for (const [k, table] of simulate({ tables: 4, compounds: 400, seed: 5 }).tables.entries()) {
      addTestTable(open, study.id, analyst.id, { mz: table.mz, minutes: table.retentionMinutes, intensity: table.intensity }, { name: `sample ${k}` })
    }
    const id = await run()
    const row = open.db.select().from(alignments).where(eq(alignments.id, id)).get()
    const parts = open.db.select({ part: alignmentTables, table: tables }).from(alignmentTables).innerJoin(tables, eq(tables.id, alignmentTables.tableId)).where(eq(alignmentTables.alignmentId, id)).all()
    expect(parts).toHaveLength(4)
    for (const { part, table } of parts) {
      const member = unpackInt32(part.member)
      const intensity = unpackFloat64(part.intensity)
      const original = readColumn(open.db, table.id, 'intensity')
      expect(member).toHaveLength(row?.groups ?? -1)
      // Every row of a table stands in exactly one group.
      expect([...member].filter(at => at >= 0).sort((a, b) => a - b)).toEqual([...Array(table.features).keys()])
      member.forEach((at, group) => expect(intensity[group]).toEqual(at < 0 ? Number.NaN : original[at]))
      expect(unpackFloat64(part.correctedMinutes)).toHaveLength(table.features)
    }
    expect(parts.some(({ part }) => part.timeCorrected && part.driftMinutes.byteLength > 0)).toBe(true)
    const detail = readAlignment(open.db, study.id, id, analyst)
    expect(detail.groupSizes.reduce((sum, n) => sum + n, 0)).toBe(detail.groups)
    expect(detail.aligned.map(table => table.features).reduce((sum, n) => sum + n, 0)).toBe(detail.groupSizes.reduce((sum, n, k) => sum + n * (k + 1), 0))
  })

  it('is never changed', async () => {
    addTwoTables()
    await run()
    expect(() => open.db.update(alignments).set({ groups: 0 }).run()).toThrow('never changed')
  })

  it('takes tables as they stand when asked for: replaced ones and ones without a sample stay out', async () => {
    addTwoTables()
    addTestTable(open, study.id, analyst.id, { ...small, intensity: [9, 9, 9] }, null)
    const old = addTestTable(open, study.id, analyst.id, { ...small, intensity: [8, 8, 8] }, { name: 'old' })
    open.db.update(tables).set({ replacedAt: new Date() }).where(eq(tables.id, old.id)).run()
    const id = await run()
    expect(readAlignment(open.db, study.id, id, analyst).aligned.map(table => table.sampleName)).toEqual(['one', '=two'])
    expect(listAlignments(open.db, study.id, analyst).ready.withoutSample).toHaveLength(1)
  })

  it('says what differs from the last run', async () => {
    addTwoTables()
    await run()
    const again = await run()
    const tighter = await run({ settings: { ...newAlignmentSchema.parse({ settings: {} }).settings, alignMassPpm: 5 } })
    addTestTable(open, study.id, analyst.id, { ...small, intensity: [7, 7, 7] }, { name: 'three' })
    const more = await run()
    const differs = (id: string) => readAlignment(open.db, study.id, id, analyst).differs
    expect(differs(again)).toEqual(['The same settings and tables as alignment 1.'])
    expect(differs(tighter)).toEqual(['Mass tolerance 5 ppm (before: mass tolerance 10 ppm).'])
    expect(differs(more)).toEqual(['Mass tolerance 10 ppm (before: mass tolerance 5 ppm).', 'Tables added: three.'])
  })

  it('is refused with a sentence where it makes no sense', () => {
    const plan = () => planAlignment(open.db, study.id, newAlignmentSchema.parse({ settings: {} }), analyst)
    expect(plan).toThrow('No table has a sample yet')
    addTestTable(open, study.id, analyst.id, small, { name: 'one' })
    expect(plan).toThrow('One table alone')
    addTestTable(open, study.id, analyst.id, { ...small, massKind: 'neutral' }, { name: 'masses' })
    expect(plan).toThrow('neutral masses')
  })

  it('is logged', async () => {
    addTwoTables()
    await run()
    expect(open.db.select().from(activity).all().map(row => row.detail)).toContain('Alignment 1: 2 tables, 4 aligned features')
  })
})

describe('a practice run', () => {
  it('is made by a student, seen by them alone, and leaves the study\'s last activity', async () => {
    addTwoTables()
    const student = addTestPerson(open, 'student')
    const id = await run({ practice: true }, student)
    expect(readAlignment(open.db, study.id, id, student).practice).toBe(true)
    expect(() => readAlignment(open.db, study.id, id, analyst)).toThrow('nothing at this address')
    expect(listAlignments(open.db, study.id, analyst).alignments).toEqual([])
    expect(() => planAlignment(open.db, study.id, newAlignmentSchema.parse({ settings: {} }), student)).toThrow('analysts and lab leads')
  })
})

describe('a wide table as given', () => {
  const wide = (rows: number[], name: string, group = 'w') => addTestTable(open, study.id, analyst.id, {
    mz: rows.map(row => 200 + row), minutes: rows.map(row => 1 + row), intensity: rows.map(row => 1000 + row), wideGroup: group, wideRow: rows,
  }, { name })

  it('keeps its rows as aligned features', async () => {
    wide([0, 1, 2], 'one')
    wide([1, 2, 4], 'two')
    const id = await run({ asGiven: true })
    const detail = readAlignment(open.db, study.id, id, analyst)
    expect(detail).toMatchObject({ asGiven: true, groups: 4, groupSizes: [2, 2] })
    const [one, two] = open.db.select().from(alignmentTables).where(eq(alignmentTables.alignmentId, id)).all().map(part => [...unpackInt32(part.member)])
    expect([one, two]).toEqual([[0, 1, 2, -1], [-1, 0, 1, 2]])
  })

  it('is matched with another by the centres of their rows', async () => {
    wide([0, 1], 'one', 'first')
    wide([1, 2], 'two', 'second')
    expect(readAlignment(open.db, study.id, await run({ asGiven: true }), analyst)).toMatchObject({ groups: 3, groupSizes: [2, 1] })
  })

  it('keeps rows apart that stand within the tolerances of each other', async () => {
    for (const name of ['one', 'two']) {
      addTestTable(open, study.id, analyst.id, { mz: [200, 200.0001], minutes: [1, 1.01], intensity: name === 'one' ? [10, 20] : [30, 40], wideGroup: 'w', wideRow: [0, 1] }, { name })
    }
    expect(readAlignment(open.db, study.id, await run({ asGiven: true }), analyst)).toMatchObject({ groups: 2, groupSizes: [0, 2] })
  })
})

describe('the matrix as CSV', () => {
  it('has a row a feature and a column a sample, and guards what would run as a formula', async () => {
    addTwoTables()
    const id = await run()
    let text = ''
    for await (const chunk of matrixCsv(open.db, study, id, analyst).chunks) text += chunk
    const lines = text.trimEnd().split('\r\n')
    expect(lines.at(-5)).toBe('feature,m/z,retention time (min),one,\'=two')
    expect(lines.at(-1)).toBe('4,400.04,4,,4100')
    expect(lines[0]).toMatch(/^\uFEFF# Steelyard: alignment 1/)
  })

  it('is for those who may export', async () => {
    addTwoTables()
    const id = await run()
    expect(() => matrixCsv(open.db, study, id, addTestPerson(open, 'student'))).toThrow('do not allow')
  })
})

it('ends with a sentence where a sample goes while a run waits', async () => {
  addTwoTables()
  const plan = planAlignment(open.db, study.id, newAlignmentSchema.parse({ settings: {} }), analyst)
  open.db.delete(samples).where(eq(samples.name, 'one')).run()
  const { id } = open.jobs.add({ kind: 'align', studyId: study.id, input: plan, personId: analyst.id })
  await open.jobs.idle()
  expect(open.db.select().from(jobs).where(eq(jobs.id, id)).get()).toMatchObject({ status: 'failed', message: expect.stringContaining('lost its sample') })
  expect(open.db.select().from(alignments).all()).toEqual([])
})
