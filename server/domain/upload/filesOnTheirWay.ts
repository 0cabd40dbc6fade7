import { and, asc, desc, eq, ne, sql } from 'drizzle-orm'
import type { UploadLine } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { jobs, samples, uploads } from '../../db/schema'
import { uploadLine } from '../table/uploadLine'

/** A study's files of one kind that are being read, wait or were refused, newest first, and the samples to choose from. */
export function filesOnTheirWay(db: Database, studyId: string, kind: 'table' | 'trace'): { uploads: UploadLine[], samples: { id: string, name: string }[] } {
  const open = db.select({ upload: uploads, job: { progress: jobs.progress, message: jobs.message } }).from(uploads).leftJoin(jobs, eq(jobs.id, uploads.jobId))
    .where(and(eq(uploads.studyId, studyId), eq(uploads.kind, kind), ne(uploads.status, 'read'))).orderBy(desc(uploads.createdAt), desc(sql`${uploads}.rowid`)).all()
  return {
    uploads: open.map(row => uploadLine(row.upload, row.job)),
    samples: db.select({ id: samples.id, name: samples.name }).from(samples).where(eq(samples.studyId, studyId)).orderBy(asc(samples.position)).all(),
  }
}
