import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity, studies } from '../../../server/db/schema'
import { listAlignments } from '../../../server/domain/alignment/listAlignments'
import type { Person } from '../../../server/domain/person/person'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let student: Person
let analyst: Person
let studyId: string
let alignmentId: string

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  student = addTestPerson(laboratory, 'student')
  analyst = addTestPerson(laboratory, 'analyst')
  studyId = addTestStudy(laboratory, analyst).id
  alignmentId = addComparedAlignment(laboratory, studyId, analyst.id, [{ name: 'one', side: 'A', intensity: [1000] }, { name: 'two', side: 'B', intensity: [4000] }]).alignment.id
})
afterEach(() => laboratory.close())

const comparisonsSeenBy = (person: Person) => listAlignments(laboratory.db, studyId, person).alignments.map(line => line.comparisons)
const lastActivity = () => laboratory.db.select().from(studies).where(eq(studies.id, studyId)).get()?.lastActivityAt

describe('a practice comparison on an official alignment', () => {
  it('is counted for its maker alone', () => {
    addKeptComparison(laboratory, studyId, analyst.id, alignmentId)
    addKeptComparison(laboratory, studyId, student.id, alignmentId, { practice: true })
    expect(comparisonsSeenBy(student)).toEqual([2])
    expect(comparisonsSeenBy(analyst)).toEqual([1])
  })

  it('leaves neither a time on the study nor its title in the activity', () => {
    const before = new Date(2020, 0, 1)
    laboratory.db.update(studies).set({ lastActivityAt: before }).where(eq(studies.id, studyId)).run()
    addKeptComparison(laboratory, studyId, student.id, alignmentId, { practice: true, title: 'What if the press was not washed' })
    expect(lastActivity()).toEqual(before)
    expect(laboratory.db.select().from(activity).all().at(-1)).toMatchObject({ action: 'make comparison', detail: 'practice copy, version 1' })
    addKeptComparison(laboratory, studyId, analyst.id, alignmentId, { title: 'Millrace' })
    expect(lastActivity()?.getTime()).toBeGreaterThan(before.getTime())
    expect(laboratory.db.select().from(activity).all().at(-1)?.detail).toBe('Millrace, version 1')
  })
})
