import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import Sqlite from 'better-sqlite3'
import { toSnakeCase } from 'drizzle-orm/casing'
import type { MigrationMeta } from 'drizzle-orm/migrator'
import { getTableConfig } from 'drizzle-orm/sqlite-core'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { migrate } from '../../../server/db/migrate'
import { openDatabase } from '../../../server/db/open'
import * as schema from '../../../server/db/schema'
import { migrations } from '../../support/laboratory'
import { fillFirstSchema } from './fillFirstSchema'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-migrate-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

const rowCounts = (sqlite: Sqlite.Database) => {
  const names = sqlite.prepare<[], { name: string }>(`SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%' AND name NOT LIKE '__drizzle%' ORDER BY name`).all()
  return Object.fromEntries(names.map(({ name }) => [name, sqlite.prepare<[], { n: number }>(`SELECT count(*) AS n FROM "${name}"`).get()?.n]))
}
const asMigrations = (...statements: string[][]): MigrationMeta[] => statements.map((sql, index) => ({ sql, bps: true, folderMillis: index + 1, hash: `test-${index}` }))

describe('the migrations of the project', () => {
  it('carry a filled database through each, with every row, and keep a copy first', async () => {
    const sqlite = new Sqlite(join(folder, 'steelyard.db'))
    await migrate(sqlite, migrations.slice(0, 1), async () => {})
    fillFirstSchema(sqlite)
    const before = rowCounts(sqlite)
    expect(Object.entries(before).filter(([name, rows]) => rows === 0 && name !== 'laboratory')).toEqual([])
    sqlite.close()

    const open = await openDatabase(folder, 'lab', migrations)
    const after = rowCounts(open.sqlite)
    expect(after).toMatchObject({ ...before, laboratory: 1 })
    expect(open.sqlite.pragma('foreign_key_check')).toEqual([])
    expect(open.sqlite.pragma('foreign_keys', { simple: true })).toBe(1)
    open.close()
    expect(readdirSync(join(folder, 'copies'))).toHaveLength(migrations.length > 1 ? 1 : 0)
  })

  it('agree with the schema in code, table by table and column by column', async () => {
    const open = await openDatabase(folder, 'lab', migrations)
    const inCode = Object.values(schema).map((table) => {
      const { name, columns } = getTableConfig(table)
      return [name, columns.map(column => toSnakeCase(column.name)).sort()] as const
    })
    const inDatabase = Object.keys(rowCounts(open.sqlite)).map(name => [name, (open.sqlite.pragma(`table_info("${name}")`) as { name: string }[]).map(column => column.name).sort()] as const)
    expect(Object.fromEntries(inDatabase)).toEqual(Object.fromEntries(inCode))
    open.close()
  })
})

describe('migrate', () => {
  const first = [`CREATE TABLE parent (id INTEGER PRIMARY KEY, name TEXT)`, `CREATE TABLE child (id INTEGER PRIMARY KEY, parent_id INTEGER NOT NULL REFERENCES parent(id) ON DELETE CASCADE)`]
  const rebuild = [`CREATE TABLE parent_new (id INTEGER PRIMARY KEY, name TEXT, extra TEXT)`, `INSERT INTO parent_new (id, name) SELECT id, name FROM parent`, `DROP TABLE parent`, `ALTER TABLE parent_new RENAME TO parent`]

  async function filled() {
    const sqlite = new Sqlite(join(folder, 'x.db'))
    sqlite.pragma('foreign_keys = ON')
    await migrate(sqlite, asMigrations(first), async () => {})
    sqlite.exec(`INSERT INTO parent VALUES (1, 'a'), (2, 'b'); INSERT INTO child VALUES (1, 1), (2, 2)`)
    return sqlite
  }

  it('keeps the children of a table that is rebuilt', async () => {
    const sqlite = await filled()
    let copies = 0
    expect(await migrate(sqlite, asMigrations(first, rebuild), async () => { copies++ })).toBe(1)
    expect(rowCounts(sqlite)).toEqual({ parent: 2, child: 2 })
    expect(copies).toBe(1)
    expect(sqlite.pragma('foreign_keys', { simple: true })).toBe(1)
    sqlite.close()
  })

  it('undoes a migration that leaves rows pointing at nothing', async () => {
    const sqlite = await filled()
    await expect(migrate(sqlite, asMigrations(first, [`DELETE FROM parent WHERE id = 1`]), async () => {})).rejects.toThrow('point at nothing')
    expect(rowCounts(sqlite)).toEqual({ parent: 2, child: 2 })
    expect(sqlite.pragma('foreign_keys', { simple: true })).toBe(1)
    sqlite.close()
  })

  it('does nothing, and copies nothing, where all is applied', async () => {
    const sqlite = await filled()
    expect(await migrate(sqlite, asMigrations(first), () => Promise.reject(new Error('copied')))).toBe(0)
    sqlite.close()
  })
})
