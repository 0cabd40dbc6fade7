import { acceptTrace } from '../../server/domain/trace/acceptTrace'
import { receiveFile, traceLimit } from '../../server/domain/upload/receiveFile'
import type { Person } from '../../server/domain/person/person'
import type { TraceUploadQuery } from '../../shared/schemas/trace'
import type { UploadAnswer } from '../../shared/types/table'
import type { TestLaboratory } from './laboratory'
import { inPieces } from './readMzml'

/** Sends an mzML file through the domain, as a person would; it is read by a job. */
export async function sendTrace(laboratory: TestLaboratory, studyId: string, person: Person, name: string, content: string | Uint8Array, query: Partial<TraceUploadQuery> = {}): Promise<UploadAnswer> {
  const file = await receiveFile(laboratory.folder, inPieces(content), traceLimit)
  return acceptTrace(laboratory, studyId, file, { name, intensityLimit: 0, ...query }, person)
}

/** The same, and waits until it is read. */
export async function uploadTrace(...[laboratory, ...rest]: Parameters<typeof sendTrace>): Promise<UploadAnswer> {
  const answer = await sendTrace(laboratory, ...rest)
  await laboratory.jobs.idle()
  return answer
}
