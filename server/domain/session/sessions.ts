import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Connection } from '../../db/open'
import { people, personRoles, sessions } from '../../db/schema'
import { record } from '../activity/record'
import type { Person } from '../person/person'
import { hashSecret, newSecret } from '../secret/secret'

export const SESSION_HOURS = 12

/** Starts a session and returns the secret that the cookie seals. */
export function startSession(db: Connection, personId: string): string {
  const secret = newSecret()
  db.insert(sessions).values({ personId, secretHash: hashSecret(secret), expiresAt: new Date(Date.now() + SESSION_HOURS * 3_600_000) }).run()
  return secret
}

/** The person a session's secret stands for: not ended, not past 12 hours, account not closed. */
export function findSessionPerson(db: Connection, secret: string): Person | null {
  const rows = db.select({ id: people.id, name: people.name, signInName: people.signInName, role: personRoles.role })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .leftJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(sessions.secretHash, hashSecret(secret)), isNull(sessions.endedAt), gt(sessions.expiresAt, new Date()), isNull(people.closedAt)))
    .all()
  const [first] = rows
  if (!first) return null
  return { id: first.id, name: first.name, signInName: first.signInName, roles: rows.flatMap(row => row.role ?? []) }
}

/** Ends one session: what a copied cookie names is gone with it. */
export function endSession(db: Connection, secret: string) {
  db.update(sessions).set({ endedAt: new Date() }).where(and(eq(sessions.secretHash, hashSecret(secret)), isNull(sessions.endedAt))).run()
}

export function signOut(db: Connection, secret: string, person: Person) {
  endSession(db, secret)
  record(db, { personId: person.id, action: 'sign out' })
}

/** Ends every session of a person: at a password change and at closing. */
export function endSessionsOf(db: Connection, personId: string) {
  db.update(sessions).set({ endedAt: new Date() }).where(and(eq(sessions.personId, personId), isNull(sessions.endedAt))).run()
}
