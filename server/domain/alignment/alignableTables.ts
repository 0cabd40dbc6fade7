import { and, asc, eq, isNull } from 'drizzle-orm'
import { isBlank } from '../../../shared/schemas/sample'
import type { AlignableTables } from '../../../shared/types/alignment'
import type { Database } from '../../db/open'
import { samples, tables } from '../../db/schema'

/** The tables of a study that an alignment would take: not replaced, and of a sample. Says what stands in the way. */
export function alignableTables(db: Database, studyId: string): AlignableTables {
  const rows = db.select({
    id: tables.id, features: tables.features, digest: tables.digest, wideGroup: tables.wideGroup, massKind: tables.massKind,
    fileName: tables.fileName, columnName: tables.columnName, sampleName: samples.name, kind: samples.kind,
  }).from(tables).leftJoin(samples, eq(samples.id, tables.sampleId))
    .where(and(eq(tables.studyId, studyId), isNull(tables.replacedAt))).orderBy(asc(samples.position), asc(tables.createdAt)).all()
  const placed = rows.filter(row => row.sampleName !== null)
  return {
    tables: placed.map(row => ({ id: row.id, sampleName: row.sampleName ?? '', features: row.features, digest: row.digest, blank: isBlank(row.kind), wide: row.wideGroup !== null })),
    withoutSample: rows.filter(row => row.sampleName === null).map(row => row.columnName ? `${row.fileName}, ${row.columnName}` : row.fileName),
    problem: problemOf(placed),
  }
}

function problemOf(rows: { massKind: 'mz' | 'neutral' }[]): string | null {
  if (rows.length === 0) return 'No table has a sample yet. Upload tables, or choose the sample of those that are there.'
  if (rows.length === 1) return 'One table alone can\'t be aligned. Upload at least one more.'
  if (rows.some(row => row.massKind === 'neutral') && rows.some(row => row.massKind === 'mz')) {
    return 'Some tables hold m/z and some neutral masses; they can\'t be aligned together. Replace the ones that were read as the wrong kind.'
  }
  return null
}
