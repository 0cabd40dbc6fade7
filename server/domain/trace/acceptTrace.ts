import { rmSync } from 'node:fs'
import { and, eq, isNull } from 'drizzle-orm'
import type { TraceUploadQuery } from '../../../shared/schemas/trace'
import type { UploadAnswer } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { traces, uploads } from '../../db/schema'
import type { TraceInput } from '../../jobs/trace'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { ReceivedFile } from '../upload/receiveFile'
import { takeFile, type UploadPlace } from '../upload/takeFile'

/** Takes a received mzML file into a study and has it read. Content that the study has already is said and not kept twice, unless it is to be read anew in its own place. */
export function acceptTrace(place: UploadPlace, studyId: string, file: ReceivedFile, { name, replaces, intensityLimit }: TraceUploadQuery, person: Person): UploadAnswer {
  const { db } = place
  try {
    if (file.bytes === 0) throw new DomainError('unreadable', 'The file is empty.')
    if (replaces !== undefined) checkReplaced(db, studyId, replaces)
    const known = knownAs(db, studyId, file.sha256, replaces)
    if (known !== null) return { upload: null, known }
    const input = (uploadId: string): TraceInput => ({ uploadId, intensityLimit, ...(replaces === undefined ? {} : { replaces }) })
    const upload = takeFile(place, { studyId, kind: 'trace', fileName: name, sha256: file.sha256, bytes: file.bytes, status: 'reading', createdBy: person.id }, file, uploadId => ({ kind: 'trace', input: input(uploadId) }))
    return { upload, known: null }
  }
  finally {
    rmSync(file.path, { force: true })
  }
}

function checkReplaced(db: Database, studyId: string, traceId: string) {
  const trace = db.select({ replacedAt: traces.replacedAt }).from(traces).where(and(eq(traces.id, traceId), eq(traces.studyId, studyId))).get()
  if (!trace) throw new DomainError('notFound', 'The trace to replace is not in this study any more.')
  if (trace.replacedAt) throw new DomainError('conflict', 'That trace has been replaced already.')
}

/** What the study has of this content, as a sentence; null where it is new. */
function knownAs(db: Database, studyId: string, sha256: string, replaces: string | undefined): string | null {
  const trace = db.select({ id: traces.id, fileName: traces.fileName }).from(traces).where(and(eq(traces.studyId, studyId), eq(traces.sha256, sha256), isNull(traces.replacedAt))).get()
  if (trace && trace.id !== replaces) return `The study has this content already, as ${trace.fileName}. It was not kept twice.`
  const upload = db.select({ fileName: uploads.fileName }).from(uploads).where(and(eq(uploads.studyId, studyId), eq(uploads.kind, 'trace'), eq(uploads.sha256, sha256), eq(uploads.status, 'reading'))).get()
  return upload ? `This content is on its way in already, as ${upload.fileName}. It was not kept twice.` : null
}
