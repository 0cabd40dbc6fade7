import { index, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { createdAt, id, moment } from './columns'

/** first: makes the first lab lead. invitation, reset: set a password. share: opens one version of a comparison. */
export type SecretKind = 'first' | 'invitation' | 'reset' | 'share'

/** Every secret address and code: only its SHA-256 is kept. */
export const secrets = sqliteTable('secrets', {
  id: id(),
  kind: text().$type<SecretKind>().notNull(),
  hash: text().notNull(),
  /** The id of what it opens: a person or a share link. */
  subject: text(),
  createdBy: text(),
  createdAt: createdAt(),
  expiresAt: moment().notNull(),
  usedAt: moment(),
  withdrawnAt: moment(),
}, table => [uniqueIndex('secrets_hash').on(table.hash), index('secrets_subject').on(table.subject)])
