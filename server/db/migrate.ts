import type Database from 'better-sqlite3'
import type { MigrationMeta } from 'drizzle-orm/migrator'

const JOURNAL = '__drizzle_migrations'

/**
 * Applies what is missing, each migration in a transaction of its own. Foreign keys are off meanwhile (inside a
 * transaction the pragma does nothing, and a rebuilt table would take its children along) and are checked after.
 * A database that already holds something is copied first by `keepCopy`.
 */
export async function migrate(sqlite: Database.Database, migrations: MigrationMeta[], keepCopy: () => Promise<void>): Promise<number> {
  sqlite.exec(`CREATE TABLE IF NOT EXISTS ${JOURNAL} (id INTEGER PRIMARY KEY, hash TEXT NOT NULL, created_at NUMERIC)`)
  const last = sqlite.prepare(`SELECT max(created_at) AS at FROM ${JOURNAL}`).get() as { at: number | null }
  const missing = migrations.filter(migration => last.at === null || migration.folderMillis > last.at)
  if (missing.length === 0) return 0
  if (last.at !== null) await keepCopy()

  sqlite.pragma('foreign_keys = OFF')
  try {
    for (const migration of missing) apply(sqlite, migration)
  }
  finally {
    sqlite.pragma('foreign_keys = ON')
  }
  return missing.length
}

function apply(sqlite: Database.Database, migration: MigrationMeta) {
  sqlite.transaction(() => {
    for (const statement of migration.sql) sqlite.exec(statement)
    const broken = sqlite.pragma('foreign_key_check') as unknown[]
    if (broken.length > 0) throw new Error(`A migration would leave ${broken.length} rows that point at nothing; nothing was changed.`)
    sqlite.prepare(`INSERT INTO ${JOURNAL} (hash, created_at) VALUES (?, ?)`).run(migration.hash, migration.folderMillis)
  }).immediate()
}
