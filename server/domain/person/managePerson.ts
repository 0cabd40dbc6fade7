import { eq } from 'drizzle-orm'
import { roleNames } from '../../../shared/permissions'
import type { PersonEdit } from '../../../shared/schemas/person'
import type { Connection, Database } from '../../db/open'
import { people, personRoles } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import { endSessionsOf } from '../session/sessions'
import { issueLink, withdrawLinks } from './invitations'
import { keepALabLead } from './lastLabLead'
import type { Person } from './person'

/** Name, e-mail and roles. Roles hold from the person's next request on. */
export function editPerson(db: Database, personId: string, input: PersonEdit, by: Person) {
  return db.transaction((tx) => {
    const person = findPerson(tx, personId)
    if (!input.roles.includes('labLead')) keepALabLead(tx, person.id)
    tx.update(people).set({ name: input.name, email: input.email || null }).where(eq(people.id, person.id)).run()
    tx.delete(personRoles).where(eq(personRoles.personId, person.id)).run()
    for (const role of new Set(input.roles)) tx.insert(personRoles).values({ personId: person.id, role }).run()
    record(tx, { personId: by.id, action: 'edit person', subjectId: person.id, detail: `${person.signInName}: ${input.roles.map(role => roleNames[role]).join(', ')}` })
    return { id: person.id }
  }, { behavior: 'immediate' })
}

/** A new one-time link; the password they have, if any, holds until it is used. */
export function renewLink(db: Database, personId: string, by: Person): { id: string, secret: string } {
  return db.transaction((tx) => {
    const person = findPerson(tx, personId)
    if (person.closedAt) throw new DomainError('conflict', 'This account is closed. Reopen it first.')
    record(tx, { personId: by.id, action: 'renew link', subjectId: person.id, detail: person.signInName })
    return { id: person.id, secret: issueLink(tx, person, by.id) }
  }, { behavior: 'immediate' })
}

/** Ends the person's sessions and withdraws their links; their work keeps their name. */
export function closePerson(db: Database, personId: string, by: Person) {
  return db.transaction((tx) => {
    const person = findPerson(tx, personId)
    if (person.closedAt) return { id: person.id }
    keepALabLead(tx, person.id)
    tx.update(people).set({ closedAt: new Date() }).where(eq(people.id, person.id)).run()
    endSessionsOf(tx, person.id)
    withdrawLinks(tx, person.id)
    record(tx, { personId: by.id, action: 'close person', subjectId: person.id, detail: person.signInName })
    return { id: person.id }
  }, { behavior: 'immediate' })
}

/** The account as it was, with the password it had. */
export function reopenPerson(db: Database, personId: string, by: Person) {
  return db.transaction((tx) => {
    const person = findPerson(tx, personId)
    if (!person.closedAt) return { id: person.id }
    tx.update(people).set({ closedAt: null }).where(eq(people.id, person.id)).run()
    record(tx, { personId: by.id, action: 'reopen person', subjectId: person.id, detail: person.signInName })
    return { id: person.id }
  }, { behavior: 'immediate' })
}

function findPerson(db: Connection, personId: string) {
  const person = db.select().from(people).where(eq(people.id, personId)).get()
  if (!person) throw notFound()
  return person
}
