import { renameSync } from 'node:fs'
import { eq } from 'drizzle-orm'
import type { UploadLine } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { uploads } from '../../db/schema'
import type { Jobs } from '../../jobs/runner'
import { record } from '../activity/record'
import { receivedPath } from '../table/originals'
import { uploadLine } from '../table/uploadLine'
import type { ReceivedFile } from './receiveFile'

export interface UploadPlace { db: Database, folder: string, jobs: Jobs }

type NewUpload = typeof uploads.$inferInsert & { kind: 'table' | 'trace' }

/** Takes a received file in: its row, its place among the files to be read, its job, and its line in the log, all or nothing. */
export function takeFile({ db, folder, jobs }: UploadPlace, row: NewUpload, file: ReceivedFile, jobFor: (uploadId: string) => { kind: string, input: unknown }): UploadLine {
  return db.transaction((tx) => {
    const upload = tx.insert(uploads).values(row).returning().get()
    renameSync(file.path, receivedPath(folder, upload.id))
    const job = jobs.add({ ...jobFor(upload.id), studyId: row.studyId, personId: row.createdBy }, { unlimited: true })
    record(tx, { personId: row.createdBy, action: row.kind === 'table' ? 'upload table' : 'upload trace', studyId: row.studyId, subjectId: upload.id, detail: row.fileName })
    return uploadLine(tx.update(uploads).set({ jobId: job.id }).where(eq(uploads.id, upload.id)).returning().get())
  }, { behavior: 'immediate' })
}
