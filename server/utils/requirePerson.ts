import type { H3Event } from 'h3'
import { can, type Action } from '../../shared/permissions'
import type { Database } from '../db/open'
import { DomainError } from '../domain/DomainError'
import type { Person } from '../domain/person/person'
import { findSessionPerson } from '../domain/session/sessions'

export interface PersonContext { db: Database, person: Person }

/** Who asks, read from the session's row on each request; null for a visitor. */
export async function readPerson(event: H3Event): Promise<Person | null> {
  const secret = await readSessionSecret(event)
  return secret ? findSessionPerson(useLaboratory().db, secret) : null
}

/** A signed-in person, with the right where one is named: 401, then 403. */
export async function requirePerson(event: H3Event, action?: Action): Promise<PersonContext> {
  const person = await readPerson(event)
  if (!person) throw new DomainError('notSignedIn', 'Please sign in.')
  if (action && !can(person, action)) throw new DomainError('forbidden', 'Your roles do not allow this.')
  return { db: useLaboratory().db, person }
}
