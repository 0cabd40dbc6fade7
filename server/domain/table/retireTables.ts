import { and, eq, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { alignmentTables, tables, uploads } from '../../db/schema'
import { record } from '../activity/record'
import { releaseOriginal } from './originals'
import type { Upload } from './uploadLine'

/** What is needed of a table that is to go: never its columns. */
export const tableBrief = { id: tables.id, studyId: tables.studyId, uploadId: tables.uploadId, sampleId: tables.sampleId, columnName: tables.columnName, wideGroup: tables.wideGroup, originalSha256: tables.originalSha256, fileName: tables.fileName, statedFloor: tables.statedFloor }
export interface TableBrief { id: string, studyId: string, uploadId: string, sampleId: string | null, columnName: string | null, wideGroup: string | null, originalSha256: string, fileName: string, statedFloor: number | null }

/** The tables that an upload takes the place of: those of the same file read anew, or the one named (of a wide file: all of it). */
export function tablesToReplace(db: Database, upload: Upload): TableBrief[] {
  const standing = and(eq(tables.studyId, upload.studyId), isNull(tables.replacedAt))
  const own = db.select(tableBrief).from(tables).where(and(standing, eq(tables.uploadId, upload.id))).all()
  const named = upload.replacesTableId === null ? undefined : db.select(tableBrief).from(tables).where(and(standing, eq(tables.id, upload.replacesTableId))).get()
  if (!named) return own
  return [...own, ...(named.wideGroup ? db.select(tableBrief).from(tables).where(and(standing, eq(tables.wideGroup, named.wideGroup))).all() : [named])]
}

/** Tables that others take the place of: one that an alignment rests on stays and is marked, the rest go. */
export function retireTables(db: Database, folder: string, upload: Upload, retired: readonly { table: TableBrief, successor: string }[]) {
  for (const { table, successor } of retired) {
    if (isUsed(db, table.id)) db.update(tables).set({ replacedAt: new Date(), replacedBy: successor }).where(eq(tables.id, table.id)).run()
    else dropTable(db, folder, table)
    record(db, { personId: upload.createdBy, action: 'replace table', studyId: table.studyId, subjectId: table.id, detail: `${table.fileName} by ${upload.fileName}` })
  }
}

/** Does an alignment rest on this table? */
export function isUsed(db: Database, tableId: string): boolean {
  return db.select({ id: alignmentTables.id }).from(alignmentTables).where(eq(alignmentTables.tableId, tableId)).get() !== undefined
}

/** Takes a table away, with its upload and its original where nothing else needs them. */
export function dropTable(db: Database, folder: string, table: TableBrief) {
  db.update(tables).set({ replacedBy: null }).where(eq(tables.replacedBy, table.id)).run()
  db.delete(tables).where(eq(tables.id, table.id)).run()
  const sibling = db.select({ id: tables.id }).from(tables).where(eq(tables.uploadId, table.uploadId)).get()
  if (!sibling) db.delete(uploads).where(and(eq(uploads.id, table.uploadId), eq(uploads.status, 'read'))).run()
  releaseOriginal(db, folder, table.originalSha256)
}
