import { gunzipSync } from 'node:zlib'
import { and, eq } from 'drizzle-orm'
import type { RefusedRow } from '../../../shared/science/table/refusals'
import { writeCsv } from '../../../shared/formats/delimitedText/writeCsv'
import type { Database } from '../../db/open'
import { tables } from '../../db/schema'
import { notFound } from '../DomainError'

/** The rows of a table's file that could not be used, with the file's name. */
export function findRefusedRows(db: Database, studyId: string, tableId: string): { fileName: string, rows: RefusedRow[] } {
  const table = db.select({ fileName: tables.fileName, refused: tables.refused }).from(tables).where(and(eq(tables.id, tableId), eq(tables.studyId, studyId))).get()
  if (!table) throw notFound()
  return { fileName: table.fileName, rows: table.refused ? JSON.parse(gunzipSync(table.refused).toString('utf8')) as RefusedRow[] : [] }
}

/** The same as a CSV document. */
export function refusedCsv(db: Database, studyId: string, tableId: string): { name: string, text: string } {
  const { fileName, rows } = findRefusedRows(db, studyId, tableId)
  const text = writeCsv(['line', 'column', 'value', 'reason'], rows.map(row => [row.line, row.column, row.value, row.reason]), [`Rows of ${fileName} that could not be used. Lines are counted from 1, the header included.`])
  return { name: `${fileName.replace(/\.[^.]*$/, '')} refused rows.csv`, text }
}
