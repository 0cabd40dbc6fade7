import { index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { JobStatus } from '../../../shared/types/job'
import { createdAt, id, moment } from './columns'
import { studies } from './studies'

export type { JobStatus }

/** Long work, done in a worker thread. Found running at start-up: queued again, at most twice. */
export const jobs = sqliteTable('jobs', {
  id: id(),
  kind: text().notNull(),
  studyId: text().references(() => studies.id, { onDelete: 'cascade' }),
  input: text({ mode: 'json' }).$type<unknown>().notNull(),
  status: text().$type<JobStatus>().notNull().default('queued'),
  /** 0 to 1. */
  progress: real().notNull().default(0),
  /** What it is doing, or why it failed, as a sentence. */
  message: text().notNull().default(''),
  /** What it made: an alignment's or a version's id. */
  resultId: text(),
  attempts: integer().notNull().default(0),
  createdBy: text().notNull(),
  createdAt: createdAt(),
  startedAt: moment(),
  endedAt: moment(),
}, table => [index('jobs_status').on(table.status), index('jobs_study').on(table.studyId)])
