import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { createdAt } from './columns'

/** Who did what. Append-only by trigger; ids without foreign keys, so a row outlives what it speaks of. */
export const activity = sqliteTable('activity', {
  id: integer().primaryKey({ autoIncrement: true }),
  at: createdAt(),
  personId: text(),
  /** A verb and a noun: `upload table`, `sign in`. */
  action: text().notNull(),
  studyId: text(),
  subjectId: text(),
  /** The act in words, without secrets. */
  detail: text().notNull().default(''),
}, table => [index('activity_study').on(table.studyId)])
