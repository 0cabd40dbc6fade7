import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity, people } from '../../../server/db/schema'
import { addPerson } from '../../../server/domain/person/addPerson'
import { acceptInvitation, findInvitation } from '../../../server/domain/person/invitations'
import { listPeople } from '../../../server/domain/person/listPeople'
import { closePerson, editPerson, renewLink, reopenPerson } from '../../../server/domain/person/managePerson'
import type { Person } from '../../../server/domain/person/person'
import { findSessionPerson, startSession } from '../../../server/domain/session/sessions'
import { personSchema } from '../../../shared/schemas/person'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { NotingHasher } from '../../support/means'

const LAST = 'This is the last lab lead.'
let laboratory: TestLaboratory
let lead: Person

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  lead = withPassword(addTestPerson(laboratory, 'labLead'))
})
afterEach(() => laboratory.close())

function withPassword(person: Person): Person {
  laboratory.db.update(people).set({ passwordHash: 'hash of something' }).where(eq(people.id, person.id)).run()
  return person
}
const input = (signInName: string, roles: string[] = ['student']) => personSchema.parse({ name: 'Ben Dow', signInName, email: '', roles })
const acts = () => laboratory.db.select().from(activity).all().map(row => row.action)
const listed = (id: string) => listPeople(laboratory.db).find(person => person.id === id)

describe('addPerson', () => {
  it('makes an account without a password, and a link that sets one', async () => {
    const { id, secret } = addPerson(laboratory.db, input('Ben.Dow', ['student', 'scientist']), lead)
    expect(listed(id)).toMatchObject({ name: 'Ben Dow', signInName: 'ben.dow', roles: ['scientist', 'student'], hasPassword: false })
    expect(listed(id)?.linkUntil).toBeInstanceOf(Date)
    await acceptInvitation(laboratory.db, secret, 'tangle ferry cobalt', new NotingHasher())
    expect(listed(id)).toMatchObject({ hasPassword: true, linkUntil: null })
    expect(acts()).toEqual(['add person', 'accept invitation'])
  })

  it('refuses a sign-in name that is taken, in whatever case, naming the field', () => {
    addPerson(laboratory.db, input('ben'), lead)
    expect(() => addPerson(laboratory.db, input('BEN'), lead)).toThrow(expect.objectContaining({ kind: 'conflict', issues: [expect.objectContaining({ field: 'signInName' })] }))
    expect(listPeople(laboratory.db)).toHaveLength(2)
  })
})

describe('editPerson', () => {
  it('changes roles from the next request on', () => {
    const ben = withPassword(addTestPerson(laboratory, 'student'))
    const secret = startSession(laboratory.db, ben.id)
    editPerson(laboratory.db, ben.id, { name: 'Ben D.', email: 'ben@lab.example', roles: ['analyst', 'analyst', 'reviewer'] }, lead)
    expect(findSessionPerson(laboratory.db, secret)).toMatchObject({ name: 'Ben D.', roles: expect.arrayContaining(['analyst', 'reviewer']) })
    expect(listed(ben.id)).toMatchObject({ email: 'ben@lab.example', roles: ['analyst', 'reviewer'] })
  })

  it('knows nobody of a made-up id', () => {
    expect(() => editPerson(laboratory.db, 'nobody', { name: 'x', email: '', roles: ['student'] }, lead)).toThrow(expect.objectContaining({ kind: 'notFound' }))
  })
})

describe('the last lab lead', () => {
  const demote = (person: Person) => editPerson(laboratory.db, person.id, { name: person.name, email: '', roles: ['analyst'] }, lead)

  it('can be neither closed nor demoted', () => {
    expect(() => closePerson(laboratory.db, lead.id, lead)).toThrow(LAST)
    expect(() => demote(lead)).toThrow(LAST)
    expect(listed(lead.id)).toMatchObject({ roles: ['labLead'], closedAt: null })
  })

  it('is not replaced by one who has not signed in, nor by a closed one', () => {
    const invited = addTestPerson(laboratory, 'labLead')
    expect(() => demote(lead)).toThrow(LAST)
    withPassword(invited)
    closePerson(laboratory.db, invited.id, lead)
    expect(() => closePerson(laboratory.db, lead.id, lead)).toThrow(LAST)
    reopenPerson(laboratory.db, invited.id, lead)
    demote(lead)
    expect(listed(lead.id)?.roles).toEqual(['analyst'])
    expect(() => demote(invited)).toThrow(LAST)
  })

  it('may take more roles', () => {
    editPerson(laboratory.db, lead.id, { name: lead.name, email: '', roles: ['labLead', 'reviewer'] }, lead)
    expect(listed(lead.id)?.roles).toEqual(['reviewer', 'labLead'])
  })
})

describe('closing', () => {
  it('ends sessions, withdraws links, keeps the account for its name, and is undone by reopening', () => {
    const ben = withPassword(addTestPerson(laboratory, 'student'))
    const session = startSession(laboratory.db, ben.id)
    const { secret } = renewLink(laboratory.db, ben.id, lead)
    closePerson(laboratory.db, ben.id, lead)
    expect(findSessionPerson(laboratory.db, session)).toBeNull()
    expect(() => findInvitation(laboratory.db, secret)).toThrow('does not open anything')
    expect(() => renewLink(laboratory.db, ben.id, lead)).toThrow('closed')
    expect(listPeople(laboratory.db).map(person => person.id)).toEqual([lead.id, ben.id])

    reopenPerson(laboratory.db, ben.id, lead)
    expect(findSessionPerson(laboratory.db, session)).toBeNull()
    expect(() => findInvitation(laboratory.db, secret)).toThrow('does not open anything')
    expect(listed(ben.id)?.closedAt).toBeNull()
    expect(acts()).toEqual(['renew link', 'close person', 'reopen person'])
  })

  it('twice is written once', () => {
    const ben = addTestPerson(laboratory, 'student')
    closePerson(laboratory.db, ben.id, lead)
    closePerson(laboratory.db, ben.id, lead)
    reopenPerson(laboratory.db, ben.id, lead)
    reopenPerson(laboratory.db, ben.id, lead)
    expect(acts()).toEqual(['close person', 'reopen person'])
  })
})
