import { asc, eq } from 'drizzle-orm'
import type { ComparisonData } from '../../../shared/formats/comparisonData'
import type { Database } from '../../db/open'
import { alignments, alignmentTables } from '../../db/schema'
import { unpackFloat64, unpackInt32 } from '../../db/packed'
import { notFound } from '../DomainError'
import { readColumn } from '../table/tableColumns'

/** The numbers of an alignment that a comparison rests on, unpacked; intensities one column a table, in the alignment's order. */
export function alignmentData(db: Database, alignmentId: string): Omit<ComparisonData, 'samples'> {
  const { mz, retentionMinutes, neighbourStart, neighbourList } = alignments
  const row = db.select({ mz, retentionMinutes, neighbourStart, neighbourList }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!row) throw notFound()
  const columns = db.select({ intensity: alignmentTables.intensity }).from(alignmentTables)
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
  return {
    mz: unpackFloat64(row.mz),
    retentionMinutes: unpackFloat64(row.retentionMinutes),
    neighbourStart: unpackInt32(row.neighbourStart),
    neighbourList: unpackInt32(row.neighbourList),
    intensity: columns.map(({ intensity }) => unpackFloat64(intensity)),
  }
}

/** All intensities of each table of an alignment, whether they found a group or not: floors are estimated from these. */
export function tableIntensities(db: Database, alignmentId: string): Float64Array[] {
  return db.select({ tableId: alignmentTables.tableId }).from(alignmentTables)
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
    .map(({ tableId }) => readColumn(db, tableId, 'intensity'))
}
