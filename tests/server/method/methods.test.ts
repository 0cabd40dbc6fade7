import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { editMethod } from '../../../server/domain/method/editMethod'
import { listMethods } from '../../../server/domain/method/listMethods'
import { makeMethod } from '../../../server/domain/method/makeMethod'
import type { Person } from '../../../server/domain/person/person'
import { methodSchema } from '../../../shared/schemas/method'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let analyst: Person
beforeAll(async () => {
  laboratory = await openTestLaboratory()
  analyst = addTestPerson(laboratory, 'analyst')
})
afterAll(() => laboratory.close())
const method = (rest: object) => methodSchema.parse({ name: 'm', polarity: 'negative', ...rest })

describe('methods', () => {
  it('keep what was written, windows too', () => {
    const input = method({ name: 'HILIC', voidMinutes: 0.8, divertWindows: [{ startMinutes: 0, endMinutes: 1.2 }, { startMinutes: 14, endMinutes: 16 }] })
    const { id } = makeMethod(laboratory.db, input, analyst)
    expect(listMethods(laboratory.db, analyst).find(each => each.id === id)).toEqual({ id, ...input, studies: [] })
  })

  it('have names of their own, in any case', () => {
    const { id } = makeMethod(laboratory.db, method({ name: 'Phenyl' }), analyst)
    makeMethod(laboratory.db, method({ name: 'Cyano' }), analyst)
    expect(() => makeMethod(laboratory.db, method({ name: 'pHENYL' }), analyst)).toThrow('called “pHENYL” already')
    expect(() => editMethod(laboratory.db, id, method({ name: 'cyano' }), analyst)).toThrow('called “cyano” already')
    expect(editMethod(laboratory.db, id, method({ name: 'PHENYL' }), analyst)).toEqual({ id })
  })

  it('say which studies use them, of those that are seen', () => {
    const open = addTestStudy(laboratory, analyst)
    const hidden = addTestStudy(laboratory, analyst, { restricted: true })
    const studiesOf = (methodId: string) => listMethods(laboratory.db, analyst).find(each => each.id === methodId)?.studies
    expect(studiesOf(open.methodId)).toEqual([{ id: open.id, title: open.title }])
    expect(studiesOf(hidden.methodId)).toEqual([])
  })

  it('refuse a window that ends before it starts, and a method that is not there', () => {
    expect(methodSchema.safeParse(method({})).success).toBe(true)
    expect(methodSchema.safeParse({ name: 'm', polarity: 'negative', divertWindows: [{ startMinutes: 2, endMinutes: 1 }] }).error?.issues[0]?.path).toEqual(['divertWindows', 0, 'endMinutes'])
    expect(() => editMethod(laboratory.db, 'nothing', method({ name: 'new' }), analyst)).toThrow('nothing at this address')
  })
})
