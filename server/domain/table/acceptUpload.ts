import { renameSync, rmSync } from 'node:fs'
import { and, eq, inArray, isNull } from 'drizzle-orm'
import type { UploadQuery } from '../../../shared/schemas/table'
import type { UploadAnswer } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { tables, uploads } from '../../db/schema'
import type { Jobs } from '../../jobs/runner'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import { receivedPath } from './originals'
import type { ReceivedFile } from './receiveFile'
import { uploadLine } from './uploadLine'

export interface UploadPlace { db: Database, folder: string, jobs: Jobs }

/**
 * Takes a received file into a study and has it read. Content that the study has already is said and not kept twice,
 * unless it is to replace another table.
 */
export function acceptUpload({ db, folder, jobs }: UploadPlace, studyId: string, file: ReceivedFile, { name, replaces }: UploadQuery, person: Person): UploadAnswer {
  try {
    if (file.bytes === 0) throw new DomainError('unreadable', 'The file is empty.')
    if (replaces !== undefined) checkReplaced(db, studyId, replaces)
    const known = knownAs(db, studyId, file.sha256)
    if (known !== null) return { upload: null, known }
    return db.transaction((tx) => {
      const upload = tx.insert(uploads).values({ studyId, fileName: name, sha256: file.sha256, bytes: file.bytes, status: 'reading', replacesTableId: replaces ?? null, createdBy: person.id }).returning().get()
      renameSync(file.path, receivedPath(folder, upload.id))
      const job = jobs.add({ kind: 'read', studyId, input: { uploadId: upload.id }, personId: person.id }, { unlimited: true })
      record(tx, { personId: person.id, action: 'upload table', studyId, subjectId: upload.id, detail: name })
      const row = tx.update(uploads).set({ jobId: job.id }).where(eq(uploads.id, upload.id)).returning().get()
      return { upload: uploadLine(row), known: null }
    }, { behavior: 'immediate' })
  }
  finally {
    rmSync(file.path, { force: true })
  }
}

function checkReplaced(db: Database, studyId: string, tableId: string) {
  const table = db.select({ replacedAt: tables.replacedAt }).from(tables).where(and(eq(tables.id, tableId), eq(tables.studyId, studyId))).get()
  if (!table) throw new DomainError('notFound', 'The table to replace is not in this study any more.')
  if (table.replacedAt) throw new DomainError('conflict', 'That table has been replaced already.')
}

/** What the study has of this content, as a sentence; null where it is new. */
function knownAs(db: Database, studyId: string, sha256: string): string | null {
  const table = db.select({ fileName: tables.fileName }).from(tables).where(and(eq(tables.studyId, studyId), eq(tables.originalSha256, sha256), isNull(tables.replacedAt))).get()
  if (table) return `The study has this content already, as ${table.fileName}. It was not kept twice.`
  const upload = db.select({ fileName: uploads.fileName }).from(uploads).where(and(eq(uploads.studyId, studyId), eq(uploads.sha256, sha256), inArray(uploads.status, ['reading', 'waiting']))).get()
  return upload ? `This content is on its way in already, as ${upload.fileName}. It was not kept twice.` : null
}
