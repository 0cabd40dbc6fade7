import { and, asc, eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { packFloat64, packInt32, unpackFloat64, unpackInt32 } from '../../db/packed'
import { tableColumns, type TableColumnName } from '../../db/schema'

/** Bytes of one part of a column. */
export const PART_BYTES = 2 ** 20

/** The columns of a table as they are kept. */
export interface KeptColumns {
  mz: Float64Array
  retentionMinutes: Float64Array
  intensity: Float64Array
  width?: Float64Array | null
  wideRow?: Int32Array | null
}

/** Keeps one packed column of a table. Each part is written before the next is asked for, so one buffer will do for all. */
export function keepColumn(db: Pick<Database, 'insert'>, tableId: string, name: TableColumnName, parts: Iterable<Buffer>) {
  let part = 0
  for (const bytes of parts) db.insert(tableColumns).values({ tableId, name, part: part++, bytes }).run()
}

/** Keeps the columns of a table that are in memory. */
export function keepColumns(db: Pick<Database, 'insert'>, tableId: string, { mz, retentionMinutes, intensity, width, wideRow }: KeptColumns) {
  for (const [name, values] of [['mz', mz], ['retentionMinutes', retentionMinutes], ['intensity', intensity], ['width', width]] as const) {
    if (values) keepColumn(db, tableId, name, cut(packFloat64(values)))
  }
  if (wideRow) keepColumn(db, tableId, 'wideRow', cut(packInt32(wideRow)))
}

function* cut(bytes: Buffer): Generator<Buffer> {
  for (let at = 0; at < bytes.length; at += PART_BYTES) yield bytes.subarray(at, at + PART_BYTES)
}

/** One column of numbers; empty where the table has none such. */
export function readColumn(db: Pick<Database, 'select'>, tableId: string, name: Exclude<TableColumnName, 'wideRow'>): Float64Array {
  return unpackFloat64(readBytes(db, tableId, name))
}

/** The rows of the wide file that the features stood in; empty for a long table. */
export function readWideRows(db: Pick<Database, 'select'>, tableId: string): Int32Array {
  return unpackInt32(readBytes(db, tableId, 'wideRow'))
}

function readBytes(db: Pick<Database, 'select'>, tableId: string, name: TableColumnName): Uint8Array {
  const parts = db.select({ bytes: tableColumns.bytes }).from(tableColumns).where(and(eq(tableColumns.tableId, tableId), eq(tableColumns.name, name))).orderBy(asc(tableColumns.part)).all()
  const [only] = parts
  return only && parts.length === 1 ? only.bytes : Uint8Array.from(Buffer.concat(parts.map(part => part.bytes)))
}
