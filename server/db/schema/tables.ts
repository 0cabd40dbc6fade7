import { blob, index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { MassKind, Measure, TableLayout } from '../../../shared/science/table/layout'
import type { RememberedAnswers } from '../../../shared/science/table/rememberAnswers'
import type { ProposalBasis } from '../../../shared/science/table/tableProposal'
import type { UploadStatus } from '../../../shared/types/table'
import { createdAt, id, moment } from './columns'
import { people } from './people'
import { samples, studies } from './studies'

/** A file as it came, kept compressed under `originals/` in the data folder by its SHA-256. */
export const originals = sqliteTable('originals', {
  sha256: text().primaryKey(),
  /** Size as it came. */
  bytes: integer().notNull(),
  compressedBytes: integer().notNull(),
  createdAt: createdAt(),
})

/** A remembered way to read one kind of export. */
export const layouts = sqliteTable('layouts', {
  id: id(),
  name: text().notNull(),
  /** The shape it reads: the words of its header (shapeFingerprint). */
  fingerprint: text().notNull(),
  /** What a person said of files of this shape; the rest each file says itself. */
  layout: text({ mode: 'json' }).$type<RememberedAnswers>().notNull(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
}, table => [index('layouts_fingerprint').on(table.fingerprint)])

/** One file a person sent, and what became of it. */
export const uploads = sqliteTable('uploads', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  /** A feature table, or raw data that give traces. */
  kind: text().$type<'table' | 'trace'>().notNull().default('table'),
  fileName: text().notNull(),
  sha256: text().notNull(),
  bytes: integer().notNull(),
  status: text().$type<UploadStatus>().notNull(),
  fingerprint: text(),
  /** What its proposal is made from; null until it was looked through. */
  proposal: text({ mode: 'json' }).$type<ProposalBasis>(),
  /** The layout a person or a remembered layout decided. */
  layout: text({ mode: 'json' }).$type<TableLayout>(),
  /** Why it was refused, or what was noticed (the same content stands already), as a sentence. */
  remark: text(),
  /** The table this one is to replace. */
  replacesTableId: text(),
  jobId: text(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  /** A waiting file is let go after this. */
  expiresAt: moment(),
}, table => [index('uploads_study').on(table.studyId)])

/** One list of features of one sample; a wide file makes one a column. */
export const tables = sqliteTable('tables', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  uploadId: text().notNull().references(() => uploads.id),
  sampleId: text().references(() => samples.id, { onDelete: 'set null' }),
  originalSha256: text().notNull().references(() => originals.sha256),
  fileName: text().notNull(),
  /** The sample column of a wide file. */
  columnName: text(),
  /** The same for all tables of one wide file. */
  wideGroup: text(),
  /** Wide files: share of empty cells; below 1 % the column seems gap-filled. */
  emptyShare: real(),
  /** SHA-256 of the packed columns m/z, minutes, intensity. */
  digest: text().notNull(),
  layout: text({ mode: 'json' }).$type<TableLayout>().notNull(),
  measure: text().$type<Measure>().notNull(),
  massKind: text().$type<MassKind>().notNull(),
  features: integer().notNull(),
  refusedRows: integer().notNull().default(0),
  /** Compressed JSON of the refused rows: line, column, value, reason. */
  refused: blob({ mode: 'buffer' }),
  /** The peak limit a person states; else the floor is estimated. */
  statedFloor: real(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  replacedAt: moment(),
  replacedBy: text(),
}, table => [index('tables_study').on(table.studyId), index('tables_sample').on(table.sampleId), index('tables_digest').on(table.digest)])

export type TableColumnName = 'mz' | 'retentionMinutes' | 'intensity' | 'width' | 'wideRow'

/**
 * The columns of a table, packed (Float64; wideRow Int32: the row of the wide file each feature stood in), each in parts of about a megabyte:
 * a row of SQLite is in memory several times over while it is written, and a table may have two million features.
 */
export const tableColumns = sqliteTable('table_columns', {
  tableId: text().notNull().references(() => tables.id, { onDelete: 'cascade' }),
  name: text().$type<TableColumnName>().notNull(),
  part: integer().notNull(),
  bytes: blob({ mode: 'buffer' }).notNull(),
}, table => [primaryKey({ columns: [table.tableId, table.name, table.part] })])
