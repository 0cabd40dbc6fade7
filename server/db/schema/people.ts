import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { Role } from '../../../shared/permissions/roles'
import { createdAt, id, moment } from './columns'

/** A person with an account. Closed, never deleted: their work keeps their name. */
export const people = sqliteTable('people', {
  id: id(),
  name: text().notNull(),
  /** Lower case, as typed at sign-in. */
  signInName: text().notNull(),
  email: text(),
  /** Null until the person has set one by their one-time link. */
  passwordHash: text(),
  /** Single keys act on the bench; a person can put them off (WCAG 2.1.4). */
  benchKeys: integer({ mode: 'boolean' }).notNull().default(true),
  createdAt: createdAt(),
  closedAt: moment(),
}, table => [uniqueIndex('people_sign_in_name').on(table.signInName)])

export const personRoles = sqliteTable('person_roles', {
  personId: text().notNull().references(() => people.id, { onDelete: 'cascade' }),
  role: text().$type<Role>().notNull(),
}, table => [primaryKey({ columns: [table.personId, table.role] })])

/** One row a sign-in: the cookie names it by a secret, of which only the hash is kept. */
export const sessions = sqliteTable('sessions', {
  id: id(),
  personId: text().notNull().references(() => people.id, { onDelete: 'cascade' }),
  secretHash: text().notNull(),
  createdAt: createdAt(),
  expiresAt: moment().notNull(),
  endedAt: moment(),
}, table => [uniqueIndex('sessions_secret_hash').on(table.secretHash), index('sessions_person').on(table.personId)])
