import { eq } from 'drizzle-orm'
import { isBlank } from '../../../shared/schemas/sample'
import type { Database } from '../../db/open'
import { samples, tables } from '../../db/schema'
import { DomainError } from '../DomainError'
import { readColumn, readWideRows } from '../table/tableColumns'
import type { AlignInput, AlignTask } from './alignInput'

/** Reads the columns of the tables for the worker. */
export function readAlignTask(db: Database, input: AlignInput): AlignTask {
  const rows = input.tableIds.map((id) => {
    const row = db.select({ table: tables, kind: samples.kind, runOrder: samples.runOrder }).from(tables).innerJoin(samples, eq(samples.id, tables.sampleId)).where(eq(tables.id, id)).get()
    if (!row) throw new DomainError('conflict', 'A table was taken away or lost its sample while this waited. Start it again.')
    return row
  })
  return {
    tables: rows.map(({ table, kind, runOrder }) => ({
      digest: table.digest,
      blank: isBlank(kind),
      runOrder,
      mz: readColumn(db, table.id, 'mz'),
      retentionMinutes: readColumn(db, table.id, 'retentionMinutes'),
      intensity: readColumn(db, table.id, 'intensity'),
    })),
    wide: rows.map(({ table }) => input.asGiven && table.wideGroup ? { group: table.wideGroup, row: readWideRows(db, table.id) } : null),
    settings: input.settings,
  }
}
