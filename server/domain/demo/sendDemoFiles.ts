import { and, eq, inArray } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { uploads } from '../../db/schema'
import type { Person } from '../person/person'
import { acceptUpload } from '../table/acceptUpload'
import { answerUpload } from '../table/answerUpload'
import { receiveFile } from '../upload/receiveFile'
import type { UploadPlace } from '../upload/takeFile'
import { awaitJobs } from './awaitJobs'
import { exportFiles } from './exportFiles'
import type { DemoStudy } from './studies'

/**
 * Sends the study's files as a person would, and answers what they leave open. Files that stand in the study already are
 * recognised by their content, so that a second start sends only what is missing.
 */
export async function sendDemoFiles(place: UploadPlace, study: DemoStudy, studyId: string, analyst: Person, signal: AbortSignal) {
  for (const { name, text } of exportFiles(study)) {
    signal.throwIfAborted()
    acceptUpload(place, studyId, await receiveFile(place.folder, bytesOf(text)), { name }, analyst)
  }
  await awaitJobs(place.db, studyId, signal)
  for (;;) {
    const waiting = place.db.select({ id: uploads.id }).from(uploads).where(and(eq(uploads.studyId, studyId), eq(uploads.status, 'waiting'))).get()
    if (!waiting) break
    answerUpload(place, studyId, waiting.id, study.answers, analyst)
    await awaitJobs(place.db, studyId, signal)
  }
  refuseLeftOut(place.db, studyId)
}

/** Every file of a demo must be read: one that was not says why. */
export function refuseLeftOut(db: Database, studyId: string) {
  const left = db.select({ fileName: uploads.fileName, remark: uploads.remark }).from(uploads)
    .where(and(eq(uploads.studyId, studyId), inArray(uploads.status, ['reading', 'refused']))).get()
  if (left) throw new Error(`${left.fileName} was not read: ${left.remark ?? 'no reason given'}`)
}

export async function* bytesOf(text: string) {
  yield Buffer.from(text)
}
