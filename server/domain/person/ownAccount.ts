import { eq } from 'drizzle-orm'
import type { PasswordChangeInput, ProfileInput } from '../../../shared/schemas/person'
import type { Connection, Database } from '../../db/open'
import { people } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import { checkPassword } from '../session/passwordRules'
import { endSessionsOf, startSession } from '../session/sessions'
import type { SignInMeans, StartedSession } from '../session/signIn'
import { withdrawLinks } from './invitations'
import type { Person } from './person'

/** What a person may change of their account, as it stands. */
export function ownProfile(db: Connection, person: Person): Required<ProfileInput> {
  const profile = db.select({ name: people.name, benchKeys: people.benchKeys }).from(people).where(eq(people.id, person.id)).get()
  if (!profile) throw notFound()
  return profile
}

export function editProfile(db: Database, input: ProfileInput, person: Person) {
  return db.transaction((tx) => {
    tx.update(people).set(input).where(eq(people.id, person.id)).run()
    record(tx, { personId: person.id, action: 'edit profile', subjectId: person.id })
    return ownProfile(tx, person)
  })
}

/** Asks the present password, sets another, ends every session and starts a new one for the browser that asked. */
export async function changePassword(db: Database, input: PasswordChangeInput, person: Person, { hasher, attempts, from }: SignInMeans): Promise<StartedSession> {
  const giveBack = await attempts.atAccount(person.signInName, from)
  const row = db.select().from(people).where(eq(people.id, person.id)).get()
  if (!row?.passwordHash) throw notFound()
  if (!await hasher.verify(row.passwordHash, input.present)) throw new DomainError('invalid', 'The password was not changed.', [{ field: 'present', sentence: 'This is not your present password.' }])
  await giveBack()
  checkPassword(input.password, person.signInName)
  const passwordHash = await hasher.hash(input.password)
  return db.transaction((tx) => {
    tx.update(people).set({ passwordHash }).where(eq(people.id, person.id)).run()
    endSessionsOf(tx, person.id)
    withdrawLinks(tx, person.id)
    record(tx, { personId: person.id, action: 'change password', subjectId: person.id })
    return { personId: person.id, signInName: person.signInName, secret: startSession(tx, person.id) }
  }, { behavior: 'immediate' })
}
