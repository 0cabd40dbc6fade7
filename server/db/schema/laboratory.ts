import { sqliteTable, text } from 'drizzle-orm/sqlite-core'

/** What the laboratory knows of itself, a row a name: `kind` is demo or lab and never changes. */
export const laboratory = sqliteTable('laboratory', {
  name: text().primaryKey(),
  value: text().notNull(),
})
