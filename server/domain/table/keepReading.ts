import { and, eq, isNull } from 'drizzle-orm'
import { WAITING_DAYS } from '../../../shared/schemas/table'
import type { Database } from '../../db/open'
import { newId } from '../../db/schema/id'
import { originals, samples, tables, uploads } from '../../db/schema'
import { record } from '../activity/record'
import { touchStudy } from '../study/touchStudy'
import { keepReadColumns } from './keepReadColumns'
import { columnsPath, releaseReceived } from './originals'
import type { ReadTable, ReadUpload } from './readUpload'
import { remarkOf } from './readingRemark'
import { retireTables, tablesToReplace } from './retireTables'
import { sampleFinder } from './sampleFinder'
import type { Upload } from './uploadLine'

/** Keeps what a worker has read of a file, within the transaction that ends its job. Returns the upload's id. */
export function keepReading(db: Database, folder: string, uploadId: string, result: ReadUpload): string | null {
  const upload = db.select().from(uploads).where(and(eq(uploads.id, uploadId), eq(uploads.status, 'reading'))).get()
  if (!upload) return null
  if (result.compressedBytes !== null) {
    db.insert(originals).values({ sha256: upload.sha256, bytes: upload.bytes, compressedBytes: result.compressedBytes }).onConflictDoNothing().run()
  }
  const { basis, fingerprint } = result
  if (result.kind === 'waiting') {
    db.update(uploads).set({ status: 'waiting', proposal: basis, fingerprint, remark: result.remark, expiresAt: new Date(Date.now() + WAITING_DAYS * 86_400_000) }).where(eq(uploads.id, uploadId)).run()
  }
  else {
    const remark = keepTables(db, folder, upload, result)
    db.update(uploads).set({ status: 'read', proposal: basis, fingerprint, layout: result.layout, remark, expiresAt: null, replacesTableId: null }).where(eq(uploads.id, uploadId)).run()
    record(db, { personId: upload.createdBy, action: 'read table', studyId: upload.studyId, subjectId: uploadId, detail: `${upload.fileName}: ${result.rowsRead} rows` })
  }
  touchStudy(db, upload.studyId)
  releaseReceived(db, folder, uploadId)
  return uploadId
}

type Read = Extract<ReadUpload, { kind: 'read' }>

function keepTables(db: Database, folder: string, upload: Upload, { tables: read, layout, skipped, cautions }: Read): string | null {
  const replaced = tablesToReplace(db, upload)
  const findSample = sampleFinder(db.select({ id: samples.id, name: samples.name }).from(samples).where(eq(samples.studyId, upload.studyId)).all(),
    db.select({ id: tables.id, sampleId: tables.sampleId }).from(tables).where(and(eq(tables.studyId, upload.studyId), isNull(tables.replacedAt))).all(),
    new Set(replaced.map(table => table.id)))
  const sameFeatures = (digest: string) => db.select({ fileName: tables.fileName }).from(tables).where(and(eq(tables.studyId, upload.studyId), eq(tables.digest, digest), isNull(tables.replacedAt))).all()
  const twins = new Set<string>()
  const taken = new Set<string>()
  const wideGroup = layout.shape === 'wide' ? newId() : null
  const successors = new Map<string, string>()
  const counterpart = (one: ReadTable) => replaced.length === 1 && read.length === 1 ? replaced[0] : replaced.find(table => table.columnName === one.name)
  let first = ''
  for (const one of read) {
    for (const twin of sameFeatures(one.digest)) if (!replaced.length) twins.add(twin.fileName)
    const before = counterpart(one)
    const found = before?.sampleId ? findSample.claim(before.sampleId) : findSample.byName(one.name ?? upload.fileName)
    if (found.taken !== null) taken.add(found.taken)
    const { id } = db.insert(tables).values({
      studyId: upload.studyId, uploadId: upload.id, sampleId: found.sampleId, originalSha256: upload.sha256, fileName: upload.fileName, columnName: one.name, wideGroup, emptyShare: one.emptyShare,
      digest: one.digest, layout, measure: layout.measure, massKind: layout.massKind, features: one.features, refusedRows: one.refusedRows, refused: one.refused && Buffer.from(one.refused),
      statedFloor: before?.statedFloor ?? null, createdBy: upload.createdBy,
    }).returning({ id: tables.id }).get()
    keepReadColumns(db, id, columnsPath(folder, upload.id), one.columns)
    first ||= id
    if (before) successors.set(before.id, id)
  }
  retireTables(db, folder, upload, replaced.map(table => ({ table, successor: successors.get(table.id) ?? first })))
  return remarkOf({ skipped, cautions, twins: [...twins], taken: [...taken] })
}
