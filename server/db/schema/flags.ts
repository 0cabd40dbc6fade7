import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { FlagKind } from '../../../shared/schemas/flag'
import { alignments } from './alignments'
import { createdAt, id, moment } from './columns'
import { people } from './people'
import { studies } from './studies'

/** A person's mark on an aligned feature. Taken back, never deleted. */
export const flags = sqliteTable('flags', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  alignmentId: text().notNull().references(() => alignments.id, { onDelete: 'cascade' }),
  /** The aligned feature's place in its alignment. */
  featureIndex: integer().notNull(),
  kind: text().$type<FlagKind>().notNull(),
  reason: text().notNull(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  removedAt: moment(),
  removedBy: text(),
}, table => [index('flags_feature').on(table.alignmentId, table.featureIndex), index('flags_study').on(table.studyId)])
