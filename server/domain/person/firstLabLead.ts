import { randomInt } from 'node:crypto'
import type { FirstInput } from '../../../shared/schemas/person'
import type { Database } from '../../db/open'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import { findSecret } from '../secret/findSecret'
import { issueSecret } from '../secret/issueSecret'
import { spendSecret } from '../secret/spendSecret'
import { withdrawSecrets } from '../secret/withdrawSecrets'
import type { Attempts } from '../session/attempts'
import { checkPassword } from '../session/passwordRules'
import type { PasswordHasher } from '../session/passwords'
import { startSession } from '../session/sessions'
import type { StartedSession } from '../session/signIn'
import { insertPerson } from './insertPerson'
import { hasPeople } from './listPeople'

/** Typed off a console: no letter that can be taken for another. 30 signs, 24 places: 117 bits. */
const SIGNS = '23456789ABCDEFGHJKMNPQRSTVWXYZ'
const FIRST_HOURS = 24

/** A code that makes the first lab lead, new at each start while there is no account; null as soon as there is one. */
export function issueFirstCode(db: Database): string | null {
  return db.transaction((tx) => {
    withdrawSecrets(tx, 'first', null)
    if (hasPeople(tx)) return null
    const code = Array.from({ length: 24 }, () => SIGNS.charAt(randomInt(SIGNS.length))).join('')
    issueSecret(tx, { kind: 'first', subject: null, createdBy: null, expiresAt: new Date(Date.now() + FIRST_HOURS * 3_600_000) }, code)
    return code.match(/.{4}/g)?.join('-') ?? code
  }, { behavior: 'immediate' })
}

/** Makes the first account, a lab lead, with the code of the console, and signs in. Where there is an account, there is nothing here. */
export async function makeFirstLabLead(db: Database, input: FirstInput, means: { hasher: PasswordHasher, attempts: Attempts, address: string }): Promise<StartedSession> {
  if (hasPeople(db)) throw notFound()
  const giveBack = await means.attempts.fromAddress(means.address)
  const code = findSecret(db, 'first', input.code.toUpperCase().replaceAll(/[^0-9A-Z]/g, ''))
  if (!code) throw new DomainError('invalid', 'This is not the code on the console.', [{ field: 'code', sentence: 'Not the code of the last start. A code holds for 24 hours; start the server again for a new one.' }])
  await giveBack()
  checkPassword(input.password, input.signInName)
  const passwordHash = await means.hasher.hash(input.password)
  return db.transaction((tx) => {
    if (hasPeople(tx) || !spendSecret(tx, code.id)) throw notFound()
    const person = insertPerson(tx, { name: input.name, signInName: input.signInName, email: '', roles: ['labLead'] }, passwordHash)
    record(tx, { personId: person.id, action: 'make first lab lead', subjectId: person.id, detail: person.signInName })
    return { personId: person.id, signInName: person.signInName, secret: startSession(tx, person.id) }
  }, { behavior: 'immediate' })
}
