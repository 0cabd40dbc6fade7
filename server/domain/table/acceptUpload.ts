import { rmSync } from 'node:fs'
import { and, eq, inArray, isNull } from 'drizzle-orm'
import type { UploadQuery } from '../../../shared/schemas/table'
import type { UploadAnswer } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { tables, uploads } from '../../db/schema'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { ReceivedFile } from '../upload/receiveFile'
import { takeFile, type UploadPlace } from '../upload/takeFile'

/**
 * Takes a received file into a study and has it read. Content that the study has already is said and not kept twice,
 * unless it is to replace another table.
 */
export function acceptUpload(place: UploadPlace, studyId: string, file: ReceivedFile, { name, replaces }: UploadQuery, person: Person): UploadAnswer {
  const { db } = place
  try {
    if (file.bytes === 0) throw new DomainError('unreadable', 'The file is empty.')
    if (replaces !== undefined) checkReplaced(db, studyId, replaces)
    const known = knownAs(db, studyId, file.sha256)
    if (known !== null) return { upload: null, known }
    const upload = takeFile(place, { studyId, kind: 'table', fileName: name, sha256: file.sha256, bytes: file.bytes, status: 'reading', replacesTableId: replaces ?? null, createdBy: person.id }, file, uploadId => ({ kind: 'read', input: { uploadId } }))
    return { upload, known: null }
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
