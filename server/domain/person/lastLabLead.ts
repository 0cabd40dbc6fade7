import { and, eq, isNotNull, isNull, ne } from 'drizzle-orm'
import type { Connection } from '../../db/open'
import { people, personRoles } from '../../db/schema'
import { DomainError } from '../DomainError'

/** Refuses what would leave the laboratory without a lab lead who can sign in: one who has not used their link yet does not count. */
export function keepALabLead(db: Connection, personId: string) {
  const lead = (id: ReturnType<typeof eq>) => db.select({ id: people.id }).from(people).innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(id, eq(personRoles.role, 'labLead'), isNull(people.closedAt), isNotNull(people.passwordHash))).get()
  if (lead(eq(people.id, personId)) && !lead(ne(people.id, personId))) {
    throw new DomainError('conflict', 'This is the last lab lead. Make another person lab lead first, and let them sign in once.', [{ field: 'roles', sentence: 'The last lab lead stays lab lead.' }])
  }
}
