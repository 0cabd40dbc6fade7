import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { unpackFloat64, unpackInt32 } from '../../db/packed'
import { samples, tables } from '../../db/schema'
import { DomainError } from '../DomainError'
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
      blank: kind === 'solventBlank' || kind === 'processBlank',
      runOrder,
      mz: unpackFloat64(table.mz),
      retentionMinutes: unpackFloat64(table.retentionMinutes),
      intensity: unpackFloat64(table.intensity),
    })),
    wide: rows.map(({ table }) => input.asGiven && table.wideGroup && table.wideRow ? { group: table.wideGroup, row: unpackInt32(table.wideRow) } : null),
    settings: input.settings,
  }
}
