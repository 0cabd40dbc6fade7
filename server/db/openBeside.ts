import { existsSync } from 'node:fs'
import { join } from 'node:path'
import Sqlite from 'better-sqlite3'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import type { OpenDatabase } from './open'
import * as schema from './schema'

/**
 * A second connection to a laboratory, whether its server runs or not: without the folder's lock, and without
 * migrating. For short acts on the machine itself.
 */
export function openBeside(folder: string): OpenDatabase {
  const path = join(folder, 'steelyard.db')
  if (!existsSync(path)) throw new Error(`There is no laboratory in ${folder}. Name its folder in STEELYARD_DATA.`)
  const sqlite = new Sqlite(path)
  sqlite.pragma('busy_timeout = 5000')
  sqlite.pragma('foreign_keys = ON')
  return { db: drizzle(sqlite, { schema, casing: 'snake_case' }), sqlite, close: () => sqlite.close() }
}
