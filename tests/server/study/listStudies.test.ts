import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { eq } from 'drizzle-orm'
import { samples, studies, studyMembers } from '../../../server/db/schema'
import type { Person } from '../../../server/domain/person/person'
import { findVisibleStudy } from '../../../server/domain/study/findVisibleStudy'
import { listStudies } from '../../../server/domain/study/listStudies'
import { makeStudy } from '../../../server/domain/study/makeStudy'
import { studyView } from '../../../server/domain/study/studyView'
import { touchStudy } from '../../../server/domain/study/touchStudy'
import { studyFormSchema } from '../../../shared/schemas/study'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

const newMethod = { name: 'C18, negative', polarity: 'negative' }
let laboratory: TestLaboratory
let analyst: Person
let student: Person
let openId: string
let restrictedId: string
const list = (person: Person, search = '', archived = false) => listStudies(laboratory.db, { search, archived }, person).studies.map(study => study.id)

beforeAll(async () => {
  laboratory = await openTestLaboratory()
  analyst = addTestPerson(laboratory, 'analyst')
  student = addTestPerson(laboratory, 'student')
  const { db } = laboratory
  openId = makeStudy(db, studyFormSchema.parse({ title: 'Two apple juices', question: 'What does the carton lack?', newMethod }), analyst).id
  const methodId = studyView(db, findVisibleStudy(db, openId, analyst), analyst).method.id
  restrictedId = makeStudy(db, studyFormSchema.parse({ title: 'Ölsaat', methodId, restricted: true }), analyst).id
})
afterAll(() => laboratory.close())

describe('a new study', () => {
  it('has its maker as a member, and the method made with it', () => {
    const view = studyView(laboratory.db, findVisibleStudy(laboratory.db, openId, analyst), analyst)
    expect(view).toMatchObject({ title: 'Two apple juices', sideAName: 'A', sideBName: 'B', restricted: false, createdByName: analyst.name })
    expect(view.members).toEqual([{ id: analyst.id, name: analyst.name, roles: ['analyst'], closed: false }])
    expect(view.method).toMatchObject({ name: 'C18, negative', polarity: 'negative', voidMinutes: null, divertWindows: [] })
    expect(view.counts).toEqual({ samples: 0, tables: 0, traces: 0, alignments: 0, comparisons: 0 })
  })

  it('is refused with the same method name again, and leaves nothing behind', () => {
    const before = list(analyst).length
    const again = () => makeStudy(laboratory.db, studyFormSchema.parse({ title: 'third', newMethod: { ...newMethod, name: 'c18, NEGATIVE' } }), analyst)
    expect(again).toThrow('There is a method called')
    expect(list(analyst)).toHaveLength(before)
  })

  it('needs a method', () => {
    expect(studyFormSchema.safeParse({ title: 'without' }).error?.issues[0]).toMatchObject({ path: ['methodId'], message: 'Choose a method, or make a new one.' })
  })
})

describe('the study list', () => {
  it('shows a restricted study to members only', () => {
    expect(list(analyst).sort()).toEqual([openId, restrictedId].sort())
    expect(list(student)).toEqual([openId])
    laboratory.db.insert(studyMembers).values({ studyId: restrictedId, personId: student.id }).run()
    expect(list(student)).toContain(restrictedId)
  })

  it('shows nothing to a person without a role', () => {
    expect(list({ ...analyst, roles: [] })).toEqual([])
  })

  it('finds words anywhere, in any case, all of them', () => {
    expect(list(analyst, 'CARTON apple')).toEqual([openId])
    expect(list(analyst, 'öLSAAT')).toEqual([restrictedId])
    expect(list(analyst, 'carton pear')).toEqual([])
    expect(list(analyst, '%')).toEqual([])
  })

  it('has what was touched last at the top, and counts what stands in it', () => {
    const old = new Date(Date.now() - 60_000)
    laboratory.db.update(studies).set({ lastActivityAt: old }).run()
    touchStudy(laboratory.db, restrictedId)
    expect(list(analyst)[0]).toBe(restrictedId)
    laboratory.db.insert(samples).values({ studyId: openId, position: 0, name: 'one' }).run()
    const found = listStudies(laboratory.db, { search: '', archived: false }, analyst).studies
    expect(found.find(study => study.id === openId)?.counts.samples).toBe(1)
    expect(found.find(study => study.id === restrictedId)?.counts.samples).toBe(0)
  })

  it('keeps archived studies back until they are asked for, and says how many there are', () => {
    laboratory.db.update(studies).set({ archivedAt: new Date() }).where(eq(studies.id, openId)).run()
    expect(list(analyst)).toEqual([restrictedId])
    expect(list(analyst, '', true)).toContain(openId)
    expect(listStudies(laboratory.db, { search: 'carton', archived: false }, analyst)).toEqual({ studies: [], archived: 1 })
  })
})
