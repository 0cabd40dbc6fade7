import { join } from 'node:path'
import Sqlite from 'better-sqlite3'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import * as schema from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import type { TestLaboratory } from './laboratory'

/** The database of a running server, for a test to look into and prepare; its jobs are never run from here. */
export function secondConnection(folder: string): TestLaboratory {
  const sqlite = new Sqlite(join(folder, 'steelyard.db'))
  sqlite.pragma('busy_timeout = 5000')
  sqlite.pragma('foreign_keys = ON')
  const db = drizzle(sqlite, { schema, casing: 'snake_case' })
  return { db, sqlite, folder, jobs: new Jobs({ db, folder }, {}, {}), close: () => sqlite.close() }
}
