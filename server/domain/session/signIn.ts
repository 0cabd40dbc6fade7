import { and, eq, isNull } from 'drizzle-orm'
import type { SignInInput } from '../../../shared/schemas/person'
import type { Database } from '../../db/open'
import { people } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import type { PasswordHasher } from './passwords'
import { startSession } from './sessions'

let dummyHash: Promise<string> | undefined

/** Checks name and password and starts a session. A wrong name takes as long and says the same as a wrong password. */
export async function signIn(db: Database, input: SignInInput, hasher: PasswordHasher): Promise<{ personId: string, secret: string }> {
  const person = db.select().from(people).where(and(eq(people.signInName, input.signInName.toLowerCase()), isNull(people.closedAt))).get()
  const hash = person?.passwordHash ?? await (dummyHash ??= hasher.hash('no account has this password'))
  const right = await hasher.verify(hash, input.password)
  if (!person?.passwordHash || !right) throw new DomainError('notSignedIn', 'This name and password do not fit together.')
  const secret = startSession(db, person.id)
  record(db, { personId: person.id, action: 'sign in' })
  return { personId: person.id, secret }
}
