import { existsSync, mkdirSync, mkdtempSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, describe, expect, it } from 'vitest'
import { openDatabase } from '../../../server/db/open'
import { activity } from '../../../server/db/schema'
import { record } from '../../../server/domain/activity/record'
import { migrations, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let open: TestLaboratory
afterEach(() => open.close())

describe('openDatabase', () => {
  it('keeps folder and files to their owner', async () => {
    open = await openTestLaboratory()
    expect(statSync(open.folder).mode & 0o777).toBe(0o700)
    expect(statSync(join(open.folder, 'steelyard.db')).mode & 0o777).toBe(0o600)
  })

  it('writes ahead and holds foreign keys', async () => {
    open = await openTestLaboratory()
    expect(open.sqlite.pragma('journal_mode', { simple: true })).toBe('wal')
    expect(open.sqlite.pragma('foreign_keys', { simple: true })).toBe(1)
  })

  it('refuses a second process on the same folder', async () => {
    open = await openTestLaboratory()
    await expect(openDatabase(open.folder, 'lab', migrations)).rejects.toThrow('Another Steelyard already runs')
  })

  it('never opens a real laboratory as a demo', async () => {
    open = await openTestLaboratory()
    const folder = mkdtempSync(join(tmpdir(), 'steelyard-kind-'))
    const lab = await openDatabase(folder, 'lab', migrations)
    lab.close()
    await expect(openDatabase(folder, 'demo', migrations)).rejects.toThrow('cannot be opened as a demo one')
    rmSync(folder, { recursive: true })
  })

  it('makes no new database beside the files of one that was moved away, which its sweep would take for left over', async () => {
    open = await openTestLaboratory()
    for (const name of ['originals/ab', 'traces/a']) {
      const folder = mkdtempSync(join(tmpdir(), 'steelyard-alone-'))
      mkdirSync(join(folder, name), { recursive: true })
      await expect(openDatabase(folder, 'lab', migrations)).rejects.toThrow('steelyard.db, is not there')
      expect([existsSync(join(folder, name)), existsSync(join(folder, 'steelyard.db'))]).toEqual([true, false])
      rmSync(folder, { recursive: true })
    }
  })

  it('keeps activity append-only', async () => {
    open = await openTestLaboratory()
    record(open.db, { personId: null, action: 'try log' })
    expect(() => open.db.delete(activity).run()).toThrow('append-only')
    expect(() => open.db.update(activity).set({ action: 'other' }).run()).toThrow('append-only')
    expect(open.db.select().from(activity).all()).toHaveLength(1)
  })
})
