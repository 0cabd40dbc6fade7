import { and, eq } from 'drizzle-orm'
import { DEFAULT_INTENSITY_LIMIT } from '../../../shared/schemas/trace'
import { uploads } from '../../db/schema'
import type { Person } from '../person/person'
import { acceptTrace } from '../trace/acceptTrace'
import { receiveFile, traceLimit } from '../upload/receiveFile'
import type { UploadPlace } from '../upload/takeFile'
import { awaitJobs } from './awaitJobs'
import { runFileName, runFiles } from './runFiles'
import { bytesOf, refuseLeftOut } from './sendDemoFiles'
import type { DemoStudy } from './studies'

/** Sends the raw data of the study's traced samples as a person would; those that were sent by an earlier start are not made again. */
export async function sendDemoTraces(place: UploadPlace, study: DemoStudy, studyId: string, analyst: Person, signal: AbortSignal) {
  const sent = new Set(place.db.select({ fileName: uploads.fileName }).from(uploads).where(and(eq(uploads.studyId, studyId), eq(uploads.kind, 'trace'))).all().map(row => row.fileName))
  const missing = study.traced.filter(sample => !sent.has(runFileName(sample)))
  if (missing.length > 0) for (const { name, text } of runFiles(study, missing)) {
    signal.throwIfAborted()
    acceptTrace(place, studyId, await receiveFile(place.folder, bytesOf(text), traceLimit), { name, intensityLimit: DEFAULT_INTENSITY_LIMIT }, analyst)
  }
  await awaitJobs(place.db, studyId, signal)
  refuseLeftOut(place.db, studyId)
}
