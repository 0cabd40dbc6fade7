import { blob, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { AlignmentSettings } from '../../../shared/science/alignment/settings'
import { createdAt, id } from './columns'
import { people } from './people'
import { samples, studies } from './studies'
import { tables } from './tables'

/** A run that finds which features of different tables are the same. Written once, in one transaction, by its job. */
export const alignments = sqliteTable('alignments', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  /** 1, 2, 3 … within the study, practice runs counted too. */
  number: integer().notNull(),
  /** A practice run is seen by the person who made it. */
  practice: integer({ mode: 'boolean' }).notNull().default(false),
  /** The rows of a wide table taken as they stand. */
  asGiven: integer({ mode: 'boolean' }).notNull().default(false),
  settings: text({ mode: 'json' }).$type<AlignmentSettings>().notNull(),
  engineVersion: text().notNull(),
  /** The alignment it was started from, and what differs, as sentences. */
  rerunOf: text(),
  differs: text({ mode: 'json' }).$type<string[]>().notNull().default([]),
  groups: integer().notNull(),
  /** Position of the reference table, or -1. */
  reference: integer().notNull(),
  /** Packed per group: Float64 m/z and minutes, Int32 size. */
  mz: blob({ mode: 'buffer' }).notNull(),
  retentionMinutes: blob({ mode: 'buffer' }).notNull(),
  groupSize: blob({ mode: 'buffer' }).notNull(),
  /** Packed Int32: the groups within tolerance of each, as starts (groups + 1) and one list. */
  neighbourStart: blob({ mode: 'buffer' }).notNull(),
  neighbourList: blob({ mode: 'buffer' }).notNull(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
}, table => [index('alignments_study').on(table.studyId)])

/** One table's part in an alignment. */
export const alignmentTables = sqliteTable('alignment_tables', {
  id: id(),
  alignmentId: text().notNull().references(() => alignments.id, { onDelete: 'cascade' }),
  position: integer().notNull(),
  tableId: text().notNull().references(() => tables.id),
  sampleId: text().references(() => samples.id, { onDelete: 'set null' }),
  /** As they were: name of the sample, digest of the table. */
  sampleName: text().notNull(),
  tableDigest: text().notNull(),
  /** Packed per group: Float64 intensity (NaN = not detected), Int32 member row (-1 = none). */
  intensity: blob({ mode: 'buffer' }).notNull(),
  member: blob({ mode: 'buffer' }).notNull(),
  /** Packed Float64 per row of the table. */
  correctedMinutes: blob({ mode: 'buffer' }).notNull(),
  /** Packed Int32: rows left out beside a nearer one, and the groups they would have joined. */
  leftOutRow: blob({ mode: 'buffer' }).notNull(),
  leftOutGroup: blob({ mode: 'buffer' }).notNull(),
  offsetPpm: real().notNull(),
  offsetApplied: integer({ mode: 'boolean' }).notNull(),
  timeCorrected: integer({ mode: 'boolean' }).notNull(),
  landmarks: integer().notNull(),
  /** What was done about drift and why, as a sentence. */
  driftReason: text().notNull(),
  /** Packed Float64: the drift curve's knots and its shift there, minutes. */
  driftMinutes: blob({ mode: 'buffer' }).notNull(),
  driftShift: blob({ mode: 'buffer' }).notNull(),
  residualMedianPpm: real(),
  residualMedianMinutes: real(),
}, table => [index('alignment_tables_alignment').on(table.alignmentId), index('alignment_tables_table').on(table.tableId)])
