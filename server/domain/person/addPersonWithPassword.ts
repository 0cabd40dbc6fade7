import { eq } from 'drizzle-orm'
import type { PersonInput } from '../../../shared/schemas/person'
import type { Database } from '../../db/open'
import { laboratory } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import { insertPerson } from './insertPerson'

/**
 * An account whose password somebody else chose and may know: for the demo laboratory alone. In a real one, people set
 * their own by a one-time link, and this is refused.
 */
export function addPersonWithPassword(db: Database, input: PersonInput, passwordHash: string): { id: string } {
  return db.transaction((tx) => {
    const kind = tx.select().from(laboratory).where(eq(laboratory.name, 'kind')).get()?.value
    if (kind !== 'demo') throw new DomainError('forbidden', 'Demo accounts can\'t be made in a real laboratory.')
    const person = insertPerson(tx, input, passwordHash)
    record(tx, { personId: null, action: 'add demo account', subjectId: person.id, detail: input.signInName })
    return { id: person.id }
  }, { behavior: 'immediate' })
}
