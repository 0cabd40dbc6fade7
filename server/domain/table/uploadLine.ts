import { proposeLayout } from '../../../shared/science/table/proposeLayout'
import type { UploadLine } from '../../../shared/types/table'
import type { uploads } from '../../db/schema'

export type Upload = typeof uploads.$inferSelect

/** An upload as pages see it, with its job while it is being read. */
export function uploadLine(row: Upload, job: { progress: number, message: string } | null = null): UploadLine {
  const { id, fileName, bytes, status, remark, jobId, fingerprint, createdAt, expiresAt } = row
  return { id, fileName, bytes, status, remark, jobId, fingerprint, progress: status === 'reading' && job ? { share: job.progress, message: job.message } : null, open: status === 'waiting' ? openFields(row) : [], createdAt: createdAt.toISOString(), expiresAt: expiresAt?.toISOString() ?? null }
}

function openFields({ proposal }: Upload): string[] {
  if (!proposal) return []
  const { questions, confirmations } = proposeLayout(proposal.survey, proposal.answers, proposal.remembered)
  return [...questions, ...confirmations].map(question => question.field)
}
