import { existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { and, eq, inArray } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { originals, tables, uploads } from '../../db/schema'

/** Where an original is kept, compressed, by the SHA-256 of the file as it came. */
export function originalPath(folder: string, sha256: string): string {
  return join(folder, 'originals', sha256.slice(0, 2), `${sha256}.gz`)
}

/** Files received whole, whose reading has not ended. Unlike `incoming/` they outlive a restart. */
export function receivedPath(folder: string, uploadId: string): string {
  mkdirSync(join(folder, 'received'), { recursive: true, mode: 0o700 })
  return join(folder, 'received', uploadId)
}

/** The columns that a worker has read of a file, on their way into the database. */
export const columnsPath = (folder: string, uploadId: string) => `${receivedPath(folder, uploadId)}.columns`

/** Lets an original go that no table and no waiting file needs. Call it after its last owner is gone. */
export function releaseOriginal(db: Database, folder: string, sha256: string) {
  const table = db.select({ id: tables.id }).from(tables).where(eq(tables.originalSha256, sha256)).get()
  const upload = db.select({ id: uploads.id }).from(uploads).where(and(eq(uploads.sha256, sha256), inArray(uploads.status, ['reading', 'waiting']))).get()
  if (table || upload) return
  db.delete(originals).where(eq(originals.sha256, sha256)).run()
  afterTransaction(() => {
    const kept = db.select({ sha256: originals.sha256 }).from(originals).where(eq(originals.sha256, sha256)).get()
    if (!kept) rmSync(originalPath(folder, sha256), { force: true })
  })
}

/** Lets a received file go once the transaction that made it unneeded has ended. */
export function releaseReceived(db: Database, folder: string, uploadId: string) {
  afterTransaction(() => {
    const upload = db.select({ status: uploads.status }).from(uploads).where(eq(uploads.id, uploadId)).get()
    if (upload?.status === 'reading') return
    rmSync(receivedPath(folder, uploadId), { force: true })
    rmSync(columnsPath(folder, uploadId), { force: true })
  })
}

/** Transactions run to their end without a pause, so what is queued now runs after it; a file goes only when the database no longer names it. */
const afterTransaction = queueMicrotask

/** At start-up: takes away what a killed process left half done among the files. The database is right; files without a row go. */
export function sweepFiles(db: Database, folder: string) {
  const open = db.select({ id: uploads.id, status: uploads.status, sha256: uploads.sha256 }).from(uploads).where(inArray(uploads.status, ['reading', 'waiting'])).all()
  const reading = new Set(open.filter(row => row.status === 'reading').map(row => row.id))
  const received = join(folder, 'received')
  if (existsSync(received)) for (const name of readdirSync(received)) if (!reading.has(name)) rmSync(join(received, name), { force: true })
  const kept = new Set([...open, ...db.select({ sha256: originals.sha256 }).from(originals).all()].map(row => `${row.sha256}.gz`))
  for (const group of readdirSync(join(folder, 'originals'), { withFileTypes: true })) {
    if (!group.isDirectory()) continue
    for (const name of readdirSync(join(folder, 'originals', group.name))) {
      if (!kept.has(name)) rmSync(join(folder, 'originals', group.name, name), { force: true })
    }
  }
}
