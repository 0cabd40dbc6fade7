import { createHash } from 'node:crypto'
import type { OpenDatabase } from '../../server/db/open'
import { packFloat64 } from '../../server/db/packed'
import { originals, samples, tables, uploads } from '../../server/db/schema'
import { keepColumns } from '../../server/domain/table/tableColumns'
import type { SampleInput } from '../../shared/schemas/sample'
import type { MassKind, TableLayout } from '../../shared/science/table/layout'

export interface TestTable {
  mz: readonly number[] | Float64Array
  minutes: readonly number[] | Float64Array
  intensity: readonly number[] | Float64Array
  massKind?: MassKind
  /** Taken as it is; else made from the columns. */
  digest?: string
  statedFloor?: number | null
  emptyShare?: number
  wideGroup?: string
  wideRow?: readonly number[]
}

let made = 0

/** A table as if it had been uploaded and read, and its sample; `sample: null` leaves it without one. */
export function addTestTable({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, table: TestTable, sample: (Partial<SampleInput> & { name: string }) | null) {
  const [mz, retentionMinutes, intensity] = [table.mz, table.minutes, table.intensity].map(column => Float64Array.from(column))
  if (!mz || !retentionMinutes || !intensity) throw new Error('a table has three columns')
  const digest = table.digest ?? createHash('sha256').update(packFloat64(mz)).update(packFloat64(retentionMinutes)).update(packFloat64(intensity)).digest('hex')
  const fileName = `${sample?.name ?? `table ${++made}`}.csv`
  db.insert(originals).values({ sha256: digest, bytes: 1, compressedBytes: 1 }).onConflictDoNothing().run()
  const upload = db.insert(uploads).values({ studyId, fileName, sha256: digest, bytes: 1, status: 'read', createdBy }).returning().get()
  const sampleId = sample ? db.insert(samples).values({ studyId, position: ++made, ...sample }).returning().get().id : null
  const row = db.insert(tables).values({
    studyId, uploadId: upload.id, sampleId, originalSha256: digest, fileName, digest, layout: {} as TableLayout, measure: 'area', massKind: table.massKind ?? 'mz',
    features: table.mz.length, statedFloor: table.statedFloor ?? null, createdBy,
    wideGroup: table.wideGroup ?? null, emptyShare: table.emptyShare ?? null, columnName: table.wideGroup || table.emptyShare !== undefined ? sample?.name ?? null : null,
  }).returning().get()
  keepColumns(db, row.id, { mz, retentionMinutes, intensity, wideRow: table.wideRow && Int32Array.from(table.wideRow) })
  return row
}
