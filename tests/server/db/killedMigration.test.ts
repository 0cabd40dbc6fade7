import { spawn } from 'node:child_process'
import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import Sqlite from 'better-sqlite3'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { migrate } from '../../../server/db/migrate'
import { slowMigrations } from './slowMigrations'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-killed-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

/** Migrates in a process of its own, which is killed while the second migration's transaction is open. */
async function migrateAndKill(path: string) {
  const script = fileURLToPath(new URL('slowMigrations.ts', import.meta.url))
  const child = spawn(process.execPath, ['--import', 'tsx', script, path], { stdio: ['ignore', 'pipe', 'inherit'] })
  await new Promise<void>((resolve, reject) => {
    child.stdout.once('data', () => setTimeout(resolve, 150))
    child.once('exit', code => reject(new Error(`the migration ended (${code}) before it could be killed`)))
  })
  const exited = new Promise(resolve => child.once('exit', (_, signal) => resolve(signal)))
  child.kill('SIGKILL')
  expect(await exited).toBe('SIGKILL')
}

it('leaves a sound database, with all or nothing of a migration, when the process is killed in it', async () => {
  const path = join(folder, 'x.db')
  await migrateAndKill(path)
  expect(readdirSync(folder)).toContain('x.db-wal')

  const sqlite = new Sqlite(path)
  expect(sqlite.pragma('integrity_check', { simple: true })).toBe('ok')
  expect(sqlite.prepare(`SELECT count(*) AS n FROM sqlite_master WHERE name = 'second'`).get()).toEqual({ n: 0 })
  expect(sqlite.prepare(`SELECT count(*) AS n FROM first`).get()).toEqual({ n: 3 })

  expect(await migrate(sqlite, slowMigrations(1000), async () => {})).toBe(1)
  expect(sqlite.prepare(`SELECT count(*) AS n FROM second`).get()).toEqual({ n: 1000 })
  sqlite.close()
})
