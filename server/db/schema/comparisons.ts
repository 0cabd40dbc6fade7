import { blob, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { ComparedSample, ComparisonSettings } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'
import { alignments } from './alignments'
import { createdAt, id, moment } from './columns'
import { people } from './people'
import { studies } from './studies'

/** Two sides of an alignment. What it says stands in its versions. */
export const comparisons = sqliteTable('comparisons', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  title: text().notNull(),
  /** A practice copy is seen by the person who made it. */
  practice: integer({ mode: 'boolean' }).notNull().default(false),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  archivedAt: moment(),
}, table => [index('comparisons_study').on(table.studyId)])

/** Immutable (a trigger refuses updates): settings, sides and samples as they were, and the verdicts. */
export const comparisonVersions = sqliteTable('comparison_versions', {
  id: id(),
  comparisonId: text().notNull().references(() => comparisons.id, { onDelete: 'cascade' }),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  alignmentId: text().notNull().references(() => alignments.id),
  number: integer().notNull(),
  sideAName: text().notNull(),
  sideBName: text().notNull(),
  settings: text({ mode: 'json' }).$type<ComparisonSettings>().notNull(),
  samples: text({ mode: 'json' }).$type<ComparedSample[]>().notNull(),
  /** The raw data that were looked into, by the sample's place among `samples`; empty: none. */
  traces: text({ mode: 'json' }).$type<UsedTrace[]>().notNull().default([]),
  engineVersion: text().notNull(),
  /** What differs from the version before, as sentences. */
  differs: text({ mode: 'json' }).$type<string[]>().notNull().default([]),
  cautions: text({ mode: 'json' }).$type<string[]>().notNull().default([]),
  /** Aligned features by verdict. */
  counts: text({ mode: 'json' }).$type<Record<string, number>>().notNull(),
  /** The verdict columns, packed by shared/formats/verdictColumns and compressed. */
  columns: blob({ mode: 'buffer' }).notNull(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
}, table => [uniqueIndex('comparison_versions_number').on(table.comparisonId, table.number), index('comparison_versions_alignment').on(table.alignmentId)])

/** A secret address that shows one version read-only; the secret itself is in `secrets`. */
export const shareLinks = sqliteTable('share_links', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  versionId: text().notNull().references(() => comparisonVersions.id),
  /** Whom it is for, as the maker noted it. */
  label: text().notNull().default(''),
  allowExport: integer({ mode: 'boolean' }).notNull().default(false),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
}, table => [index('share_links_version').on(table.versionId), index('share_links_study').on(table.studyId)])
