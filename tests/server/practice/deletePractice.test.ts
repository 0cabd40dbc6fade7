import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity, alignments, comparisons, comparisonVersions, flags } from '../../../server/db/schema'
import { addFlags } from '../../../server/domain/flag/addFlags'
import type { Person } from '../../../server/domain/person/person'
import { deletePracticeAlignment } from '../../../server/domain/practice/deletePracticeAlignment'
import { deletePracticeComparison } from '../../../server/domain/practice/deletePracticeComparison'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let student: Person
let lead: Person
let studyId: string

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  student = addTestPerson(laboratory, 'student')
  lead = addTestPerson(laboratory, 'labLead')
  studyId = addTestStudy(laboratory, lead).id
})
afterEach(() => laboratory.close())

/** An alignment with a comparison of it, practice or official. */
function work(person: Person, practice: boolean) {
  const { alignment } = addComparedAlignment(laboratory, studyId, person.id, [{ name: `A ${person.id}`, side: 'A', intensity: [1000] }, { name: `B ${person.id}`, side: 'B', intensity: [4000] }], { practice })
  const comparisonId = addKeptComparison(laboratory, studyId, person.id, alignment.id, { practice })
  addKeptComparison(laboratory, studyId, person.id, alignment.id, { practice, comparisonId })
  addFlags(laboratory.db, alignment, { featureIndexes: [0], kind: 'ofInterest', reason: 'To see it go.' }, person)
  return { alignment, comparisonId }
}
const left = () => [alignments, comparisons, comparisonVersions, flags].map(table => laboratory.db.$count(table))

describe('one\'s own practice', () => {
  it('alignment is deleted with what rests on it, and nothing else', async () => {
    work(lead, false)
    const { alignment } = work(student, true)
    expect(await Promise.all(left())).toEqual([2, 2, 4, 2])
    deletePracticeAlignment(laboratory.db, studyId, alignment.id, student)
    expect(await Promise.all(left())).toEqual([1, 1, 2, 1])
    expect(laboratory.sqlite.pragma('foreign_key_check')).toEqual([])
    expect(laboratory.db.select().from(activity).all().at(-1)).toMatchObject({ action: 'delete practice alignment', personId: student.id, detail: 'with 1 comparison' })
  })

  it('comparison is deleted and its alignment stays', async () => {
    const { comparisonId } = work(student, true)
    deletePracticeComparison(laboratory.db, studyId, comparisonId, student)
    expect(await Promise.all(left())).toEqual([1, 0, 0, 1])
  })
})

describe('what stays', () => {
  it('another person\'s practice, which looks as if it were not there', async () => {
    const { alignment, comparisonId } = work(student, true)
    expect(() => deletePracticeAlignment(laboratory.db, studyId, alignment.id, lead)).toThrow('nothing at this address')
    expect(() => deletePracticeComparison(laboratory.db, studyId, comparisonId, lead)).toThrow('nothing at this address')
    expect(await Promise.all(left())).toEqual([1, 1, 2, 1])
  })

  it('official work, even for who made it', async () => {
    const { alignment, comparisonId } = work(lead, false)
    expect(() => deletePracticeAlignment(laboratory.db, studyId, alignment.id, lead)).toThrow('Official alignments are kept')
    expect(() => deletePracticeComparison(laboratory.db, studyId, comparisonId, lead)).toThrow('Official comparisons are kept')
    expect(await Promise.all(left())).toEqual([1, 1, 2, 1])
  })

  it('practice of another study', () => {
    const { alignment } = work(student, true)
    const other = addTestStudy(laboratory, lead)
    expect(() => deletePracticeAlignment(laboratory.db, other.id, alignment.id, student)).toThrow('nothing at this address')
  })
})
