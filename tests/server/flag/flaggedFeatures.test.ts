import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { addFlags } from '../../../server/domain/flag/addFlags'
import { flaggedFeatures } from '../../../server/domain/flag/flaggedFeatures'
import type { Person } from '../../../server/domain/person/person'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { addTestAlignment } from '../../support/testAlignment'

let laboratory: TestLaboratory
let scientist: Person
let student: Person
let studyId: string

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  scientist = addTestPerson(laboratory, 'scientist')
  student = addTestPerson(laboratory, 'student')
  studyId = addTestStudy(laboratory, scientist).id
})
afterEach(() => laboratory.close())

/** One sample a side; the first feature is found in A alone. */
const compared = (person: Person) =>
  addComparedAlignment(laboratory, studyId, person.id, [{ name: 'A1', side: 'A', intensity: [5000, 1000] }, { name: 'B1', side: 'B', intensity: [Number.NaN, 90_000] }]).alignment
const flag = (alignment: ReturnType<typeof addTestAlignment>, featureIndexes: number[], person = scientist) =>
  addFlags(laboratory.db, alignment, { featureIndexes, kind: 'ofInterest', reason: 'To look at.' }, person)
const seen = async (person: Person) => (await flaggedFeatures(laboratory.db, studyId, person))
  .map(({ featureIndex, mz, retentionMinutes, judged, practice }) => ({ featureIndex, mz, retentionMinutes, phrase: judged?.phrase ?? null, version: judged?.versionNumber ?? null, practice }))

describe('flagged features of a study', () => {
  it('stand with the verdict of the newest version on their alignment', async () => {
    const alignment = compared(scientist)
    const comparisonId = addKeptComparison(laboratory, studyId, scientist.id, alignment.id, { settings: { reachLimit: 1000 } })
    addKeptComparison(laboratory, studyId, scientist.id, alignment.id, { comparisonId })
    flag(alignment, [0, 1])
    expect(await seen(scientist)).toEqual([
      { featureIndex: 0, mz: 200, retentionMinutes: 1, phrase: 'found only in Millrace', version: 2, practice: false },
      { featureIndex: 1, mz: 201, retentionMinutes: 2, phrase: 'more in Tallow Lane', version: 2, practice: false },
    ])
  })

  it('stand with their place where nothing was compared yet', async () => {
    flag(addTestAlignment(laboratory, studyId, scientist.id), [4])
    expect(await seen(scientist)).toEqual([{ featureIndex: 4, mz: 204, retentionMinutes: 5, phrase: null, version: null, practice: false }])
  })

  it('of practice are seen by its maker alone, and practice verdicts do not stand for official ones', async () => {
    const official = compared(scientist)
    addKeptComparison(laboratory, studyId, student.id, official.id, { practice: true })
    flag(official, [0])
    const practice = addTestAlignment(laboratory, studyId, student.id, { practice: true })
    flag(practice, [1], student)
    expect((await seen(scientist)).map(each => [each.featureIndex, each.phrase])).toEqual([[0, null]])
    expect((await seen(student)).map(each => [each.featureIndex, each.practice, each.phrase])).toEqual([[0, false, null], [1, true, null]])
  })
})
