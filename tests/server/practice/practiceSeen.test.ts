import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { jobs, studies } from '../../../server/db/schema'
import { listAlignments } from '../../../server/domain/alignment/listAlignments'
import { readAlignment } from '../../../server/domain/alignment/readAlignment'
import { compareVersions } from '../../../server/domain/comparison/compareVersions'
import { listComparisons } from '../../../server/domain/comparison/listComparisons'
import { prepareComparison, prepareVersion } from '../../../server/domain/comparison/prepareComparison'
import { readComparison } from '../../../server/domain/comparison/readComparison'
import { findJob } from '../../../server/domain/job/findJob'
import type { Person } from '../../../server/domain/person/person'
import { newComparisonSchema } from '../../../shared/schemas/comparison'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let analyst: Person
let student: Person
let study: ReturnType<typeof addTestStudy>
let official: { alignmentId: string, comparisonId: string }
let practice: { alignmentId: string, comparisonId: string }

/** An alignment of one sample a side with a comparison of it. */
function work(person: Person, isPractice: boolean) {
  const columns = [{ name: `A of ${person.id}`, side: 'A' as const, intensity: [5000, 1000] }, { name: `B of ${person.id}`, side: 'B' as const, intensity: [Number.NaN, 1100] }]
  const alignmentId = addComparedAlignment(laboratory, study.id, person.id, columns, { practice: isPractice }).alignment.id
  return { alignmentId, comparisonId: addKeptComparison(laboratory, study.id, person.id, alignmentId, { practice: isPractice }) }
}

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  analyst = addTestPerson(laboratory, 'analyst', 'labLead')
  student = addTestPerson(laboratory, 'student')
  study = addTestStudy(laboratory, analyst)
  official = work(analyst, false)
  practice = work(student, true)
})
afterEach(() => laboratory.close())

const gone = 'nothing at this address'

describe('practice work', () => {
  it('is listed and read by its maker alone', () => {
    const { db } = laboratory
    const alignmentsOf = (person: Person) => listAlignments(db, study.id, person).alignments.map(line => [line.id, line.practice])
    const comparisonsOf = (person: Person) => listComparisons(db, study.id, person).map(line => [line.id, line.practice])
    expect(alignmentsOf(analyst)).toEqual([[official.alignmentId, false]])
    expect(new Set(alignmentsOf(student).map(String))).toEqual(new Set([`${official.alignmentId},false`, `${practice.alignmentId},true`]))
    expect(comparisonsOf(analyst)).toEqual([[official.comparisonId, false]])
    expect(comparisonsOf(student).length).toBe(2)
    expect(() => readAlignment(db, study.id, practice.alignmentId, analyst)).toThrow(gone)
    expect(() => readComparison(db, study.id, practice.comparisonId, analyst)).toThrow(gone)
    expect(readComparison(db, study.id, practice.comparisonId, student)).toMatchObject({ practice: true, mayChange: true })
  })

  it('is held against official work by its maker alone', async () => {
    const { db } = laboratory
    const changes = await compareVersions(db, study.id, practice.comparisonId, { againstComparison: official.comparisonId }, student)
    expect(changes.before.comparisonId).toBe(official.comparisonId)
    expect(changes.matched + changes.onlyAfter).toBe(2)
    await expect(compareVersions(db, study.id, practice.comparisonId, { againstComparison: official.comparisonId }, analyst)).rejects.toThrow(gone)
    await expect(compareVersions(db, study.id, official.comparisonId, { againstComparison: practice.comparisonId }, analyst)).rejects.toThrow(gone)
  })

  it('never becomes official, and official work never rests on it', () => {
    const { db } = laboratory
    const input = newComparisonSchema.parse({ alignmentId: practice.alignmentId })
    expect(prepareComparison(db, study, input, student).practice).toBe(true)
    expect(() => prepareComparison(db, study, input, analyst)).toThrow(gone)
    const own = work(analyst, true)
    const onOwnPractice = { from: 1, settings: comparisonDefaults, sides: {}, useSheet: false, alignmentId: own.alignmentId }
    expect(() => prepareVersion(db, study, official.comparisonId, onOwnPractice, analyst)).toThrow('can\'t rest on a practice alignment')
  })

  it('does not mark the study as changed; its jobs are its maker\'s', () => {
    const { db } = laboratory
    const before = new Date(1000)
    db.update(studies).set({ lastActivityAt: before }).where(eq(studies.id, study.id)).run()
    addKeptComparison(laboratory, study.id, student.id, practice.alignmentId, { practice: true, comparisonId: practice.comparisonId, settings: { reachLimit: 9 } })
    expect(db.select().from(studies).where(eq(studies.id, study.id)).get()?.lastActivityAt).toEqual(before)
    addKeptComparison(laboratory, study.id, analyst.id, official.alignmentId, { comparisonId: official.comparisonId, settings: { reachLimit: 9 } })
    expect(db.select().from(studies).where(eq(studies.id, study.id)).get()?.lastActivityAt).not.toEqual(before)

    const job = db.insert(jobs).values({ kind: 'align', studyId: study.id, input: { practice: true }, createdBy: student.id }).returning().get()
    expect(findJob(db, job.id, student).id).toBe(job.id)
    expect(() => findJob(db, job.id, analyst)).toThrow(gone)
  })
})
