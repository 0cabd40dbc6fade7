import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { activity, people, studyMembers } from '../../../server/db/schema'
import type { Person } from '../../../server/domain/person/person'
import { archiveStudy } from '../../../server/domain/study/archiveStudy'
import { editStudy } from '../../../server/domain/study/editStudy'
import { findVisibleStudy } from '../../../server/domain/study/findVisibleStudy'
import { makeStudy } from '../../../server/domain/study/makeStudy'
import { addMember, readMembers, removeMember } from '../../../server/domain/study/members'
import { studyFormSchema } from '../../../shared/schemas/study'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let analyst: Person
let lead: Person
let student: Person
let methodId: string
const form = (rest: object) => studyFormSchema.parse({ title: 'one', methodId, ...rest })
const made = (restricted: boolean) => findVisibleStudy(laboratory.db, makeStudy(laboratory.db, form({ restricted }), analyst).id, analyst)

beforeAll(async () => {
  laboratory = await openTestLaboratory()
  analyst = addTestPerson(laboratory, 'analyst')
  lead = addTestPerson(laboratory, 'labLead')
  student = addTestPerson(laboratory, 'student')
  methodId = addTestStudy(laboratory, analyst).methodId
})
afterAll(() => laboratory.close())

describe('members of a restricted study', () => {
  it('see it from when they are added until they are taken out', () => {
    const study = made(true)
    expect(() => findVisibleStudy(laboratory.db, study.id, student)).toThrow('nothing at this address')
    expect(addMember(laboratory.db, study, student.id, analyst).members.map(member => member.id)).toContain(student.id)
    expect(findVisibleStudy(laboratory.db, study.id, student).id).toBe(study.id)
    removeMember(laboratory.db, study, student.id, analyst)
    expect(() => findVisibleStudy(laboratory.db, study.id, student)).toThrow('nothing at this address')
  })

  it('keep one who may edit', () => {
    const study = made(true)
    addMember(laboratory.db, study, student.id, analyst)
    expect(() => removeMember(laboratory.db, study, analyst.id, analyst)).toThrow('the last member who may edit')
    addMember(laboratory.db, study, lead.id, analyst)
    expect(removeMember(laboratory.db, study, analyst.id, analyst)).toEqual({ members: [], others: [] })
  })

  it('keep one whose account is open', () => {
    const study = made(true)
    const closed = addTestPerson(laboratory, 'analyst')
    addMember(laboratory.db, study, closed.id, analyst)
    laboratory.db.update(people).set({ closedAt: new Date() }).where(eq(people.id, closed.id)).run()
    expect(() => removeMember(laboratory.db, study, analyst.id, analyst)).toThrow('the last member who may edit')
  })

  it('are offered to those alone who may add them', () => {
    const study = made(false)
    expect(readMembers(laboratory.db, study, analyst).others.map(person => person.id)).toContain(lead.id)
    expect(readMembers(laboratory.db, study, student).others).toEqual([])
  })

  it('can be no one without an open account', () => {
    const study = made(true)
    expect(() => addMember(laboratory.db, study, 'nobody', analyst)).toThrow('nothing at this address')
    expect(() => removeMember(laboratory.db, study, 'nobody', analyst)).toThrow('nothing at this address')
  })
})

describe('an edited study', () => {
  it('has who restricts it as a member', () => {
    const study = made(false)
    editStudy(laboratory.db, study, form({ title: 'two', restricted: true }), lead)
    expect(findVisibleStudy(laboratory.db, study.id, lead).title).toBe('two')
    expect(laboratory.db.select().from(studyMembers).where(eq(studyMembers.studyId, study.id)).all()).toHaveLength(2)
    expect(laboratory.db.select().from(activity).where(eq(activity.studyId, study.id)).all().at(-1)).toMatchObject({ action: 'edit study', detail: 'title, restricted', personId: lead.id })
  })

  it('moves up in the list', () => {
    const study = made(false)
    const before = study.lastActivityAt.getTime()
    editStudy(laboratory.db, study, form({ matrix: 'juice' }), analyst)
    expect(findVisibleStudy(laboratory.db, study.id, analyst).lastActivityAt.getTime()).toBeGreaterThanOrEqual(before)
  })
})

describe('an archived study', () => {
  it('comes back, and asking twice is one act', () => {
    const study = made(false)
    expect(archiveStudy(laboratory.db, study, true, lead).archivedAt).not.toBeNull()
    const archived = findVisibleStudy(laboratory.db, study.id, lead)
    expect(archiveStudy(laboratory.db, archived, true, lead).archivedAt).toBe(archived.archivedAt?.toISOString())
    expect(archiveStudy(laboratory.db, archived, false, lead)).toEqual({ archivedAt: null })
    const acts = laboratory.db.select().from(activity).where(eq(activity.studyId, study.id)).all().map(act => act.action)
    expect(acts).toEqual(['make study', 'archive study', 'bring back study'])
  })
})
