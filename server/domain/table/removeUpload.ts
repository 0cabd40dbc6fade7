import { and, eq, lt } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { uploads } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import type { UploadPlace } from '../upload/takeFile'
import { releaseOriginal, releaseReceived } from './originals'

/** Takes away a file that waits or was refused, or stops one that is being read for the first time. Tables go by removeTable, traces by removeTrace. */
export function removeUpload({ db, folder, jobs }: UploadPlace, studyId: string, uploadId: string, person: Person): { id: string } {
  const upload = db.select().from(uploads).where(and(eq(uploads.id, uploadId), eq(uploads.studyId, studyId))).get()
  if (!upload) throw notFound()
  if (upload.status === 'read') throw new DomainError('conflict', upload.kind === 'trace' ? 'This file has been read. Remove its trace instead.' : 'This file has been read. Remove its tables instead.')
  if (upload.status === 'reading' && upload.jobId !== null) jobs.cancel(upload.jobId)
  const after = db.select({ status: uploads.status }).from(uploads).where(eq(uploads.id, uploadId)).get()
  // Read anew, and stopped: the tables of its first reading stand.
  if (after?.status === 'read') return { id: uploadId }
  db.transaction(() => {
    dropUpload(db, folder, upload)
    record(db, { personId: person.id, action: 'remove upload', studyId, subjectId: uploadId, detail: upload.fileName })
  }, { behavior: 'immediate' })
  return { id: uploadId }
}

function dropUpload(db: Database, folder: string, upload: { id: string, sha256: string }) {
  db.delete(uploads).where(eq(uploads.id, upload.id)).run()
  releaseReceived(db, folder, upload.id)
  releaseOriginal(db, folder, upload.sha256)
}

/** Lets go of files whose time to be answered has ended. */
export function dropExpiredUploads(db: Database, folder: string, now = new Date()) {
  db.transaction(() => {
    for (const upload of db.select().from(uploads).where(and(eq(uploads.status, 'waiting'), lt(uploads.expiresAt, now))).all()) {
      dropUpload(db, folder, upload)
      record(db, { personId: null, action: 'expire upload', studyId: upload.studyId, subjectId: upload.id, detail: upload.fileName })
    }
  }, { behavior: 'immediate' })
}
