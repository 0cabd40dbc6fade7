import type { PersonInput } from '../../../shared/schemas/person'
import { roleNames } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { record } from '../activity/record'
import { insertPerson } from './insertPerson'
import { issueLink } from './invitations'
import type { Person } from './person'

/** A new account without a password, and the secret of the one-time link that sets one. */
export function addPerson(db: Database, input: PersonInput, by: Person): { id: string, secret: string } {
  return db.transaction((tx) => {
    const person = insertPerson(tx, input, null)
    record(tx, { personId: by.id, action: 'add person', subjectId: person.id, detail: `${input.signInName}: ${input.roles.map(role => roleNames[role]).join(', ')}` })
    return { id: person.id, secret: issueLink(tx, person, by.id) }
  }, { behavior: 'immediate' })
}
