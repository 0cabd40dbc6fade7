import type { UploadLine } from '../../../shared/types/table'
import type { uploads } from '../../db/schema'

export type Upload = typeof uploads.$inferSelect

/** An upload as pages see it. */
export function uploadLine(row: Upload): UploadLine {
  const { id, fileName, bytes, status, remark, jobId, fingerprint, createdAt, expiresAt } = row
  return { id, fileName, bytes, status, remark, jobId, fingerprint, createdAt: createdAt.toISOString(), expiresAt: expiresAt?.toISOString() ?? null }
}
