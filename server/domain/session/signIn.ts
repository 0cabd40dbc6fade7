import { and, eq, isNull } from 'drizzle-orm'
import type { SignInInput } from '../../../shared/schemas/person'
import type { Database } from '../../db/open'
import { people } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import type { Attempts, AttemptSource } from './attempts'
import type { PasswordHasher } from './passwords'
import { startSession } from './sessions'

/** What checking a password takes: the hasher, the count of attempts, and where this one comes from. */
export interface SignInMeans { hasher: PasswordHasher, attempts: Attempts, from: AttemptSource }

export interface StartedSession { personId: string, signInName: string, secret: string }

const dummyHashes = new WeakMap<PasswordHasher, string>()

/** Checks name and password and starts a session. A wrong name takes as long and says the same as a wrong password. */
export async function signIn(db: Database, input: SignInInput, { hasher, attempts, from }: SignInMeans): Promise<StartedSession> {
  const giveBack = await attempts.atAccount(input.signInName, from)
  // Made before anyone is looked up, so that the first attempt too takes the same time for every name.
  const dummy = dummyHashes.get(hasher) ?? await hasher.hash('no account has this password')
  dummyHashes.set(hasher, dummy)
  const person = db.select().from(people).where(and(eq(people.signInName, input.signInName), isNull(people.closedAt))).get()
  const right = await hasher.verify(person?.passwordHash ?? dummy, input.password)
  if (!person?.passwordHash || !right) throw new DomainError('notSignedIn', 'This name and password do not fit together.')
  await giveBack()
  return db.transaction((tx) => {
    const secret = startSession(tx, person.id)
    record(tx, { personId: person.id, action: 'sign in' })
    return { personId: person.id, signInName: person.signInName, secret }
  })
}
