import { existsSync } from 'node:fs'
import { desc, eq } from 'drizzle-orm'
import { layouts, uploads } from '../db/schema'
import { DomainError } from '../domain/DomainError'
import { abandonReading } from '../domain/table/abandonReading'
import { keepReading } from '../domain/table/keepReading'
import { columnsPath, originalPath, receivedPath } from '../domain/table/originals'
import type { ReadTask, ReadUpload } from '../domain/table/readUpload'
import type { JobKind } from './kind'

export interface ReadInput {
  uploadId: string
  /** A person has settled what was open. */
  decided?: true
}

/** Reads one uploaded file: into tables, into the list of files that wait for an answer, or not at all. */
export const read: JobKind<ReadInput, ReadUpload> = {
  worker: 'read',
  heapMb: 48,
  youngHeapMb: 2,
  prepare({ db, folder }, { uploadId, decided }) {
    const upload = db.select().from(uploads).where(eq(uploads.id, uploadId)).get()
    if (upload?.status !== 'reading') throw new DomainError('conflict', 'This file is not to be read any more.')
    const received = receivedPath(folder, uploadId)
    const original = originalPath(folder, upload.sha256)
    const compressed = !existsSync(received)
    if (compressed && !existsSync(original)) throw new DomainError('conflict', 'The file is not there any more. Please upload it again.')
    const remembered = db.select().from(layouts).orderBy(desc(layouts.createdAt)).all()
    const data: ReadTask = {
      uploadId, fileName: upload.fileName, path: compressed ? original : received, compressed, originalPath: original, columnsPath: columnsPath(folder, uploadId), basis: upload.proposal, decided: decided === true,
      layouts: remembered.map(({ fingerprint, layout }) => ({ fingerprint, answers: layout })),
    }
    return { data }
  },
  finish({ db, folder }, { uploadId }, result) {
    return keepReading(db, folder, uploadId, result)
  },
  abandon({ db, folder }, { uploadId }, reason) {
    abandonReading(db, folder, uploadId, reason)
  },
}
