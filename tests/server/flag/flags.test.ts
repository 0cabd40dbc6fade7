import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity } from '../../../server/db/schema'
import { findVisibleAlignment } from '../../../server/domain/alignment/findVisibleAlignment'
import { addFlags } from '../../../server/domain/flag/addFlags'
import { changeFlags } from '../../../server/domain/flag/changeFlags'
import { listFlags } from '../../../server/domain/flag/listFlags'
import { requireFlagRight } from '../../../server/domain/flag/requireFlagRight'
import type { Person } from '../../../server/domain/person/person'
import { flagSchema } from '../../../shared/schemas/flag'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { addTestAlignment } from '../../support/testAlignment'

const open = { archivedAt: null }
let laboratory: TestLaboratory
let scientist: Person
let alignment: ReturnType<typeof addTestAlignment>

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  scientist = addTestPerson(laboratory, 'scientist')
  const study = addTestStudy(laboratory, scientist)
  alignment = addTestAlignment(laboratory, study.id, scientist.id)
})
afterEach(() => laboratory.close())

const acts = () => laboratory.db.select().from(activity).all().map(({ action, detail, personId }) => ({ action, detail, personId }))

describe('flags', () => {
  it('stand on many features with one reason, by whom and when', () => {
    const { flagIds } = addFlags(laboratory.db, alignment, { featureIndexes: [7, 2, 7], kind: 'contaminant', reason: 'A plasticiser of the vials.' }, scientist)
    const listed = listFlags(laboratory.db, alignment.id)
    expect(listed.map(({ featureIndex, kind, reason, by }) => ({ featureIndex, kind, reason, by }))).toEqual([
      { featureIndex: 2, kind: 'contaminant', reason: 'A plasticiser of the vials.', by: scientist.name },
      { featureIndex: 7, kind: 'contaminant', reason: 'A plasticiser of the vials.', by: scientist.name },
    ])
    expect(listed.map(flag => flag.id).sort()).toEqual([...flagIds].sort())
    expect(Math.abs((listed[0]?.at.getTime() ?? 0) - Date.now())).toBeLessThan(60_000)
    expect(acts()).toEqual([{ action: 'flag features', detail: `contaminant: feature 3, 8 of alignment ${alignment.number}: A plasticiser of the vials.`, personId: scientist.id }])
  })

  it('are taken back and set again, and the record keeps each act', () => {
    const { flagIds } = addFlags(laboratory.db, alignment, { featureIndexes: [1, 2], kind: 'ofInterest', reason: 'A doublet.' }, scientist)
    changeFlags(laboratory.db, alignment, { flagIds, takenBack: true }, scientist)
    expect(listFlags(laboratory.db, alignment.id)).toEqual([])
    changeFlags(laboratory.db, alignment, { flagIds: flagIds.slice(0, 1), takenBack: false }, scientist)
    expect(listFlags(laboratory.db, alignment.id).map(flag => flag.featureIndex)).toEqual([1])
    expect(acts().map(act => act.action)).toEqual(['flag features', 'take back flags', 'set flags again'])
  })

  it('of another alignment are not taken back, nor the rest of the same act', () => {
    const other = addTestAlignment(laboratory, alignment.studyId, scientist.id)
    const here = addFlags(laboratory.db, alignment, { featureIndexes: [1], kind: 'ofInterest', reason: 'Here.' }, scientist)
    const there = addFlags(laboratory.db, other, { featureIndexes: [1], kind: 'ofInterest', reason: 'There.' }, scientist)
    expect(() => changeFlags(laboratory.db, alignment, { flagIds: [...here.flagIds, ...there.flagIds], takenBack: true }, scientist)).toThrow('nothing at this address')
    expect([listFlags(laboratory.db, alignment.id).length, listFlags(laboratory.db, other.id).length]).toEqual([1, 1])
  })

  it('beyond the last feature are refused, and none of the same act is set', () => {
    expect(() => addFlags(laboratory.db, alignment, { featureIndexes: [9, 10], kind: 'artefact', reason: 'Ringing.' }, scientist)).toThrow('There is no feature 11 in this alignment: it has 10.')
    expect(listFlags(laboratory.db, alignment.id)).toEqual([])
    expect(acts()).toEqual([])
  })

  it('need a reason in words', () => {
    expect(flagSchema.safeParse({ featureIndexes: [1], kind: 'artefact', reason: '  ' }).success).toBe(false)
    expect(flagSchema.safeParse({ featureIndexes: [], kind: 'artefact', reason: 'Ringing.' }).success).toBe(false)
    expect(flagSchema.safeParse({ featureIndexes: [1], kind: 'wrong', reason: 'Ringing.' }).success).toBe(false)
  })
})

describe('who may flag', () => {
  it('official work: those with the right, and nobody in an archived study', () => {
    for (const role of ['analyst', 'scientist', 'labLead'] as const) expect(() => requireFlagRight(open, alignment, addTestPerson(laboratory, role))).not.toThrow()
    for (const role of ['reviewer', 'student'] as const) expect(() => requireFlagRight(open, alignment, addTestPerson(laboratory, role))).toThrow('Your roles')
    expect(() => requireFlagRight({ archivedAt: new Date() }, alignment, scientist)).toThrow('archived')
  })

  it('practice: its maker alone, for whom alone it is there', () => {
    const student = addTestPerson(laboratory, 'student')
    const practice = addTestAlignment(laboratory, alignment.studyId, student.id, { practice: true })
    const found = findVisibleAlignment(laboratory.db, alignment.studyId, practice.id, student)
    expect(() => requireFlagRight(open, found, student)).not.toThrow()
    expect(() => findVisibleAlignment(laboratory.db, alignment.studyId, practice.id, addTestPerson(laboratory, 'labLead'))).toThrow('nothing at this address')
    expect(() => findVisibleAlignment(laboratory.db, addTestStudy(laboratory, student).id, alignment.id, scientist)).toThrow('nothing at this address')

    addFlags(laboratory.db, found, { featureIndexes: [3], kind: 'askAgain', reason: 'My own guess.' }, student)
    expect(acts().map(act => act.detail)).toEqual([`feature 4 of practice alignment ${practice.number}`])
  })
})
