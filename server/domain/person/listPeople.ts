import { and, asc, eq, gt, inArray, isNull } from 'drizzle-orm'
import { roles, type Role } from '../../../shared/permissions'
import type { Connection } from '../../db/open'
import { people, personRoles, secrets } from '../../db/schema'

export interface ListedPerson {
  id: string
  name: string
  signInName: string
  email: string
  roles: Role[]
  closedAt: Date | null
  /** false until the first one-time link was used. */
  hasPassword: boolean
  /** Until when a link that has not been used holds. */
  linkUntil: Date | null
}

/** Every account with its roles, by name, closed ones last. */
export function listPeople(db: Connection): ListedPerson[] {
  const held = db.select().from(personRoles).all()
  const links = db.select({ subject: secrets.subject, expiresAt: secrets.expiresAt }).from(secrets)
    .where(and(inArray(secrets.kind, ['invitation', 'reset']), isNull(secrets.usedAt), isNull(secrets.withdrawnAt), gt(secrets.expiresAt, new Date()))).all()
  return db.select().from(people).orderBy(asc(people.name)).all().map(person => ({
    id: person.id,
    name: person.name,
    signInName: person.signInName,
    email: person.email ?? '',
    roles: roles.filter(role => held.some(row => row.personId === person.id && row.role === role)),
    closedAt: person.closedAt,
    hasPassword: person.passwordHash !== null,
    linkUntil: links.find(link => link.subject === person.id)?.expiresAt ?? null,
  })).sort((a, b) => Number(a.closedAt !== null) - Number(b.closedAt !== null) || a.name.localeCompare(b.name, 'en'))
}

/** Is there any account, open or closed? */
export function hasPeople(db: Connection): boolean {
  return db.select({ id: people.id }).from(people).limit(1).get() !== undefined
}

/** The lab leads whose accounts are open. */
export function listLabLeads(db: Connection) {
  return db.select({ id: people.id, name: people.name, signInName: people.signInName, passwordHash: people.passwordHash })
    .from(people).innerJoin(personRoles, and(eq(personRoles.personId, people.id), eq(personRoles.role, 'labLead')))
    .where(isNull(people.closedAt)).orderBy(asc(people.name)).all()
}
