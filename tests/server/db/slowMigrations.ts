import { pathToFileURL } from 'node:url'
import Sqlite from 'better-sqlite3'
import type { MigrationMeta } from 'drizzle-orm/migrator'
import { migrate } from '../../../server/db/migrate'

/** Two migrations: a small one, and one that writes so many rows that it can be caught at work. */
export function slowMigrations(rows: number): MigrationMeta[] {
  const sql = [
    [`CREATE TABLE first (id INTEGER PRIMARY KEY)`, `INSERT INTO first VALUES (1), (2), (3)`],
    [`CREATE TABLE second (id INTEGER PRIMARY KEY, text TEXT)`, `INSERT INTO second WITH RECURSIVE n(i) AS (SELECT 1 UNION ALL SELECT i + 1 FROM n WHERE i < ${rows}) SELECT i, hex(randomblob(20)) FROM n`],
  ]
  return sql.map((statements, index) => ({ sql: statements, bps: true, folderMillis: index + 1, hash: `slow-${index}` }))
}

const [, script, path] = process.argv
if (script && path && import.meta.url === pathToFileURL(script).href) {
  const sqlite = new Sqlite(path)
  sqlite.pragma('journal_mode = WAL')
  // The copy is asked for once the first migration stands and the second is about to begin.
  await migrate(sqlite, slowMigrations(1).slice(0, 1), async () => {})
  await migrate(sqlite, slowMigrations(20_000_000), async () => console.log('begins'))
}
