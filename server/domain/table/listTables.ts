import { and, asc, count, eq, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import { GAP_FILLED_SHARE } from '../../../shared/schemas/table'
import type { StudyTables, TableLine, UploadDetail } from '../../../shared/types/table'
import type { Database } from '../../db/open'
import { alignmentTables, originals, people, samples, tables, uploads } from '../../db/schema'
import { notFound } from '../DomainError'
import { filesOnTheirWay } from '../upload/filesOnTheirWay'
import { uploadLine } from './uploadLine'

/** A study's tables, the files that are being read, wait or were refused, and the samples to choose from. */
export function listTables(db: Database, studyId: string): StudyTables {
  const successor = alias(tables, 'successor')
  const rows = db.select({
    id: tables.id, uploadId: tables.uploadId, fileName: tables.fileName, columnName: tables.columnName, wideGroup: tables.wideGroup, sampleId: tables.sampleId, sampleName: samples.name,
    features: tables.features, refusedRows: tables.refusedRows, measure: tables.measure, massKind: tables.massKind, layout: tables.layout, bytes: originals.bytes, digest: tables.digest, emptyShare: tables.emptyShare,
    statedFloor: tables.statedFloor, remark: uploads.remark, createdAt: tables.createdAt, createdByName: people.name, replacedAt: tables.replacedAt, replacedByFile: successor.fileName,
  }).from(tables)
    .innerJoin(originals, eq(originals.sha256, tables.originalSha256))
    .innerJoin(uploads, eq(uploads.id, tables.uploadId))
    .innerJoin(people, eq(people.id, tables.createdBy))
    .leftJoin(samples, eq(samples.id, tables.sampleId))
    .leftJoin(successor, eq(successor.id, tables.replacedBy))
    .where(eq(tables.studyId, studyId)).orderBy(asc(samples.position), asc(tables.createdAt), asc(sql`${tables}.rowid`)).all()
  const used = new Map(db.select({ tableId: alignmentTables.tableId, alignments: count() }).from(alignmentTables).innerJoin(tables, eq(tables.id, alignmentTables.tableId))
    .where(eq(tables.studyId, studyId)).groupBy(alignmentTables.tableId).all().map(row => [row.tableId, row.alignments]))
  const lines = rows.map(({ layout, emptyShare, ...row }): TableLine => ({
    ...row, timeUnit: layout.timeUnit, gapFilled: emptyShare !== null && emptyShare < GAP_FILLED_SHARE, alignments: used.get(row.id) ?? 0,
    createdAt: row.createdAt.toISOString(), replacedAt: row.replacedAt?.toISOString() ?? null,
  }))
  return { tables: lines, ...filesOnTheirWay(db, studyId, 'table') }
}

/** One upload with what its proposal is made from. */
export function findUpload(db: Database, studyId: string, uploadId: string): UploadDetail {
  const row = db.select().from(uploads).where(and(eq(uploads.id, uploadId), eq(uploads.studyId, studyId))).get()
  if (!row) throw notFound()
  const { made } = db.select({ made: count() }).from(tables).where(eq(tables.uploadId, uploadId)).get() ?? { made: 0 }
  return { ...uploadLine(row), basis: row.proposal, tables: made }
}
