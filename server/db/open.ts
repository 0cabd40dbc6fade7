import { chmodSync, existsSync, mkdirSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import Sqlite from 'better-sqlite3'
import { drizzle, type BetterSQLite3Database } from 'drizzle-orm/better-sqlite3'
import type { MigrationMeta } from 'drizzle-orm/migrator'
import { migrate } from './migrate'
import * as schema from './schema'
import { triggers } from './triggers'

export type Database = BetterSQLite3Database<typeof schema>
/** The database, or the transaction under way on it. */
export type Connection = Pick<Database, 'select' | 'insert' | 'update' | 'delete' | 'query'>
export type LaboratoryKind = 'demo' | 'lab'

export interface OpenDatabase {
  db: Database
  sqlite: Sqlite.Database
  close: () => void
}

/**
 * Opens the laboratory in `folder` (made where it is missing, 0700), refuses a second process on it, migrates it, and
 * holds it to its kind: a real laboratory never turns into a demo or back.
 */
export async function openDatabase(folder: string, kind: LaboratoryKind, migrations: MigrationMeta[]): Promise<OpenDatabase> {
  for (const path of [folder, join(folder, 'originals'), join(folder, 'incoming'), join(folder, 'copies')]) {
    mkdirSync(path, { recursive: true, mode: 0o700 })
    chmodSync(path, 0o700)
  }
  const path = join(folder, 'steelyard.db')
  refuseFilesAlone(folder, path)
  const lock = lockFolder(folder)
  const sqlite = new Sqlite(path)
  chmodSync(path, 0o600)
  sqlite.pragma('journal_mode = WAL')
  sqlite.pragma('synchronous = NORMAL')
  sqlite.pragma('busy_timeout = 5000')
  sqlite.pragma('foreign_keys = ON')
  sqlite.pragma('wal_autocheckpoint = 4000')

  const close = () => {
    sqlite.close()
    lock.close()
  }
  try {
    await migrate(sqlite, migrations, async () => {
      const copy = join(folder, 'copies', `before-migration-${new Date().toISOString().replaceAll(':', '-')}.db`)
      await sqlite.backup(copy)
      chmodSync(copy, 0o600)
    })
    sqlite.exec(triggers)
    const db = drizzle(sqlite, { schema, casing: 'snake_case' })
    holdKind(db, kind, folder)
    return { db, sqlite, close }
  }
  catch (error) {
    close()
    throw error
  }
}

/** Files that no row names are taken away at start: beside a new database that would be all of them. */
function refuseFilesAlone(folder: string, path: string) {
  const holds = (name: string) => existsSync(join(folder, name)) && readdirSync(join(folder, name)).some(each => !each.startsWith('.'))
  if (existsSync(path) || !(holds('originals') || holds('traces'))) return
  throw new Error(`${folder} holds files of a laboratory, but its database, steelyard.db, is not there. Put it back, or name another folder in STEELYARD_DATA.`)
}

/** SQLite holds the lock, so it goes with the process, however that ends. */
function lockFolder(folder: string): Sqlite.Database {
  const path = join(folder, 'lock.db')
  const lock = new Sqlite(path, { timeout: 3000 })
  chmodSync(path, 0o600)
  try {
    lock.exec('BEGIN EXCLUSIVE')
    return lock
  }
  catch {
    lock.close()
    throw new Error(`Another Steelyard already runs on ${folder}. Stop it first, or name another folder in STEELYARD_DATA.`)
  }
}

function holdKind(db: Database, kind: LaboratoryKind, folder: string) {
  const row = db.query.laboratory.findFirst({ where: (table, { eq }) => eq(table.name, 'kind') }).sync()
  if (!row) db.insert(schema.laboratory).values({ name: 'kind', value: kind }).run()
  else if (row.value !== kind) throw new Error(`${folder} holds a ${row.value === 'demo' ? 'demo' : 'real'} laboratory; it cannot be opened as a ${kind === 'demo' ? 'demo' : 'real'} one.`)
}
