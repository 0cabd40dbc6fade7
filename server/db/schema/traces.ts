import { blob, index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { alignments } from './alignments'
import { createdAt, id, moment } from './columns'
import { people } from './people'
import { samples, studies } from './studies'

/**
 * What is kept of one sample's raw data: its total and base peak traces here, and its MS1 centroids as files under
 * `traces/<id>/` in the data folder, one a slice of 10 m/z. The mzML itself is not kept. Never changed, only replaced.
 */
export const traces = sqliteTable('traces', {
  id: id(),
  studyId: text().notNull().references(() => studies.id, { onDelete: 'cascade' }),
  sampleId: text().references(() => samples.id, { onDelete: 'set null' }),
  fileName: text().notNull(),
  /** Of the file as it came. */
  sha256: text().notNull(),
  bytes: integer().notNull(),
  /** What its traces and slices take on disk. */
  keptBytes: integer().notNull(),
  polarity: text().$type<'positive' | 'negative'>().notNull(),
  /** The file holds profile data, not centroids. */
  profile: integer({ mode: 'boolean' }).notNull(),
  scans: integer().notNull(),
  centroids: integer().notNull(),
  /** Centroids below this intensity were not kept; 0: all were. */
  intensityLimit: real().notNull(),
  lowestMz: real().notNull(),
  highestMz: real().notNull(),
  /** Packed Float64 a scan, in the order of time: minutes as the file has them, TIC and BPC in counts. */
  minutes: blob({ mode: 'buffer' }).notNull(),
  total: blob({ mode: 'buffer' }).notNull(),
  base: blob({ mode: 'buffer' }).notNull(),
  createdBy: text().notNull().references(() => people.id),
  createdAt: createdAt(),
  /** Another trace of the same sample stands in its place since then; kept for the versions that used it. */
  replacedAt: moment(),
}, table => [index('traces_study').on(table.studyId), index('traces_sample').on(table.sampleId)])

/** The highest extracted signal of every aligned feature in one sample's trace, at the feature's m/z and time. Derived, never changed. */
export const traceMaxima = sqliteTable('trace_maxima', {
  alignmentId: text().notNull().references(() => alignments.id, { onDelete: 'cascade' }),
  traceId: text().notNull().references(() => traces.id, { onDelete: 'cascade' }),
  /** Packed Float64 an aligned feature: counts; 0 where nothing was there, NaN where the trace does not say. */
  maxima: blob({ mode: 'buffer' }).notNull(),
  createdAt: createdAt(),
}, table => [primaryKey({ columns: [table.alignmentId, table.traceId] })])
