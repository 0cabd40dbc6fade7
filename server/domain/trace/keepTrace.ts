import { and, eq, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { packFloat64 } from '../../db/packed'
import { samples, traces, uploads } from '../../db/schema'
import type { TraceInput } from '../../jobs/trace'
import { record } from '../activity/record'
import { touchStudy } from '../study/touchStudy'
import { releaseReceived } from '../table/originals'
import { sampleFinder } from '../table/sampleFinder'
import type { ReadTrace } from './readTrace'
import { retireTrace } from './retireTrace'
import { releaseTraceFiles } from './traceFiles'

/** Keeps what a worker has read of an mzML file, within the transaction that ends its job. Its points lie in their folder already. Returns the trace's id. */
export function keepTrace(db: Database, folder: string, { uploadId, replaces, intensityLimit }: TraceInput, read: ReadTrace): string | null {
  const upload = db.select().from(uploads).where(and(eq(uploads.id, uploadId), eq(uploads.status, 'reading'))).get()
  if (!upload) {
    releaseTraceFiles(db, folder, uploadId)
    return null
  }
  const { studyId, fileName, sha256, bytes, createdBy } = upload
  const before = replaces === undefined ? undefined : db.select({ id: traces.id, studyId: traces.studyId, sampleId: traces.sampleId, fileName: traces.fileName }).from(traces).where(and(eq(traces.id, replaces), eq(traces.studyId, studyId), isNull(traces.replacedAt))).get()
  const findSample = sampleFinder(db.select({ id: samples.id, name: samples.name }).from(samples).where(eq(samples.studyId, studyId)).all(),
    db.select({ id: traces.id, sampleId: traces.sampleId }).from(traces).where(and(eq(traces.studyId, studyId), isNull(traces.replacedAt))).all(), new Set(before ? [before.id] : []))
  const found = before?.sampleId ? findSample.claim(before.sampleId) : findSample.byName(fileName)
  const minutes = packFloat64(read.traces.minutes)
  const total = packFloat64(read.traces.total)
  const base = packFloat64(read.traces.base)
  const { scans, centroids, polarity, profile, lowestMz, highestMz } = read
  const keptBytes = read.keptBytes + minutes.length + total.length + base.length
  db.insert(traces).values({ id: uploadId, studyId, sampleId: found.sampleId, fileName, sha256, bytes, keptBytes, polarity, profile, scans, centroids, intensityLimit, lowestMz, highestMz, minutes, total, base, createdBy }).run()
  if (before) {
    retireTrace(db, folder, before)
    record(db, { personId: createdBy, action: 'replace trace', studyId, subjectId: before.id, detail: `${before.fileName} by ${fileName}` })
  }
  const remarks = [...read.remarks, ...(found.taken === null ? [] : [`“${found.taken}” has a trace already: choose a sample, or replace that trace.`])]
  db.update(uploads).set({ status: 'read', remark: remarks.length > 0 ? remarks.join(' ') : null }).where(eq(uploads.id, uploadId)).run()
  record(db, { personId: createdBy, action: 'read trace', studyId, subjectId: uploadId, detail: `${fileName}: ${scans} scans` })
  touchStudy(db, studyId)
  releaseReceived(db, folder, uploadId)
  return uploadId
}

/** A reading that ended without a trace: nothing of the file stays, and its line says why. */
export function abandonTrace(db: Database, folder: string, uploadId: string, reason: string) {
  db.update(uploads).set({ status: 'refused', remark: reason }).where(and(eq(uploads.id, uploadId), eq(uploads.status, 'reading'))).run()
  releaseReceived(db, folder, uploadId)
  releaseTraceFiles(db, folder, uploadId)
}
