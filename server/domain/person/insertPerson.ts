import { eq } from 'drizzle-orm'
import type { PersonInput } from '../../../shared/schemas/person'
import type { Connection } from '../../db/open'
import { people, personRoles } from '../../db/schema'
import { DomainError } from '../DomainError'

/** Writes an account and its roles; the sign-in name must be free. */
export function insertPerson(db: Connection, input: PersonInput, passwordHash: string | null) {
  const taken = db.select({ id: people.id }).from(people).where(eq(people.signInName, input.signInName)).get()
  if (taken) throw new DomainError('conflict', 'This sign-in name is taken.', [{ field: 'signInName', sentence: 'Taken by another account. Choose another one.' }])
  const row = db.insert(people).values({ name: input.name, signInName: input.signInName, email: input.email || null, passwordHash }).returning().get()
  for (const role of new Set(input.roles)) db.insert(personRoles).values({ personId: row.id, role }).run()
  return row
}
