import { existsSync } from 'node:fs'
import { eq } from 'drizzle-orm'
import { methods, studies, uploads } from '../db/schema'
import { DomainError } from '../domain/DomainError'
import { receivedPath } from '../domain/table/originals'
import { abandonTrace, keepTrace } from '../domain/trace/keepTrace'
import type { ReadTrace, TraceTask } from '../domain/trace/readTrace'
import type { JobContext, JobKind } from './kind'

export interface TraceInput {
  uploadId: string
  /** Points below it are not kept. */
  intensityLimit: number
  /** The trace that this one takes the place of. */
  replaces?: string
}

/** Reads one mzML file into a sample's traces and points, or not at all. */
export const trace: JobKind<TraceInput, ReadTrace> = {
  worker: 'trace',
  // The text of one scan's array; points lie outside of the heap.
  heapMb: 96,
  youngHeapMb: 8,
  tooMuch: 'The file can\'t be read: single parts of it need more memory than any instrument\'s file does. Please export it again as plain mzML.',
  // A hundred files dropped at once are no reason for others to wait with a comparison.
  givesWay: true,
  // A gigabyte on a slow machine that does other work too.
  mostMinutes: 60,
  prepare({ db, folder }, { uploadId, intensityLimit }) {
    const upload = db.select().from(uploads).where(eq(uploads.id, uploadId)).get()
    if (upload?.status !== 'reading') throw new DomainError('conflict', 'This file is not to be read any more.')
    const path = receivedPath(folder, uploadId)
    if (!existsSync(path)) throw new DomainError('conflict', 'The file is not there any more. Please upload it again.')
    const data: TraceTask = { traceId: uploadId, fileName: upload.fileName, path, bytes: upload.bytes, folder, polarity: polarityOf({ db, folder }, upload.studyId), intensityLimit }
    return { data }
  },
  finish({ db, folder }, input, result) {
    return keepTrace(db, folder, input, result)
  },
  abandon({ db, folder }, { uploadId }, reason) {
    abandonTrace(db, folder, uploadId, reason)
  },
}

function polarityOf({ db }: JobContext, studyId: string): 'positive' | 'negative' {
  const method = db.select({ polarity: methods.polarity }).from(studies).innerJoin(methods, eq(methods.id, studies.methodId)).where(eq(studies.id, studyId)).get()
  if (!method) throw new DomainError('conflict', 'The study is not there any more.')
  return method.polarity
}
