import { and, eq, isNull } from 'drizzle-orm'
import type { Connection, Database } from '../../db/open'
import { people } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import { findSecret } from '../secret/findSecret'
import { issueSecret } from '../secret/issueSecret'
import { spendSecret } from '../secret/spendSecret'
import { withdrawSecrets } from '../secret/withdrawSecrets'
import { checkPassword } from '../session/passwordRules'
import type { PasswordHasher } from '../session/passwords'
import { endSessionsOf, startSession } from '../session/sessions'
import type { StartedSession } from '../session/signIn'

const LINK_DAYS = 7

/** Wrong, used, expired and withdrawn links look the same. */
const linkNotFound = () => new DomainError('notFound', 'This link does not open anything. It may have been used already, have been replaced by a newer one, or be too old. Ask your lab lead for a new link.')

/** A new one-time link's secret for an account; it withdraws the ones before it. */
export function issueLink(db: Connection, person: { id: string, passwordHash: string | null }, createdBy: string | null): string {
  withdrawLinks(db, person.id)
  return issueSecret(db, { kind: person.passwordHash === null ? 'invitation' : 'reset', subject: person.id, createdBy, expiresAt: new Date(Date.now() + LINK_DAYS * 86_400_000) })
}

export function withdrawLinks(db: Connection, personId: string) {
  withdrawSecrets(db, 'invitation', personId)
  withdrawSecrets(db, 'reset', personId)
}

/** Whom a link is for. */
export function findInvitation(db: Connection, secret: string) {
  const row = findSecret(db, 'invitation', secret) ?? findSecret(db, 'reset', secret)
  const person = row?.subject && db.select().from(people).where(and(eq(people.id, row.subject), isNull(people.closedAt))).get()
  if (!row || !person) throw linkNotFound()
  return { secretId: row.id, personId: person.id, name: person.name, signInName: person.signInName, hasPassword: person.passwordHash !== null }
}

/** Sets the password a link was given for, ends what sessions there were, and signs in. The link opens nothing afterwards. */
export async function acceptInvitation(db: Database, secret: string, password: string, hasher: PasswordHasher): Promise<StartedSession> {
  const { secretId, personId, signInName, hasPassword } = findInvitation(db, secret)
  checkPassword(password, signInName)
  const passwordHash = await hasher.hash(password)
  return db.transaction((tx) => {
    if (!spendSecret(tx, secretId)) throw linkNotFound()
    tx.update(people).set({ passwordHash }).where(eq(people.id, personId)).run()
    endSessionsOf(tx, personId)
    record(tx, { personId, action: hasPassword ? 'reset password' : 'accept invitation', subjectId: personId })
    return { personId, signInName, secret: startSession(tx, personId) }
  }, { behavior: 'immediate' })
}
