import { eq } from 'drizzle-orm'
import { WAITING_DAYS } from '../../../shared/schemas/table'
import type { Database } from '../../db/open'
import { tables, uploads } from '../../db/schema'
import { releaseOriginal, releaseReceived } from './originals'

/** A reading that ended without tables: a file that stood before stands as it was, a refused one goes, and its line says why. */
export function abandonReading(db: Database, folder: string, uploadId: string, reason: string) {
  const upload = db.select().from(uploads).where(eq(uploads.id, uploadId)).get()
  if (upload?.status !== 'reading') return
  const stands = db.select({ id: tables.id }).from(tables).where(eq(tables.uploadId, uploadId)).get()
  if (stands || upload.proposal) {
    const expiresAt = stands ? null : new Date(Date.now() + WAITING_DAYS * 86_400_000)
    db.update(uploads).set({ status: stands ? 'read' : 'waiting', remark: reason, expiresAt }).where(eq(uploads.id, uploadId)).run()
    return
  }
  db.update(uploads).set({ status: 'refused', remark: reason, proposal: null, layout: null }).where(eq(uploads.id, uploadId)).run()
  releaseReceived(db, folder, uploadId)
  releaseOriginal(db, folder, upload.sha256)
}
