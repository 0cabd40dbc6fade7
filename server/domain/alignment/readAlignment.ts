import { asc, eq } from 'drizzle-orm'
import type { AlignedTable, AlignmentDetail } from '../../../shared/types/alignment'
import type { Database } from '../../db/open'
import { unpackFloat64, unpackInt32 } from '../../db/packed'
import { alignments, alignmentTables, tables } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { alignmentLines } from './listAlignments'

/** One alignment with what it did to each table. */
export function readAlignment(db: Database, studyId: string, alignmentId: string, person: Person): AlignmentDetail {
  const [line] = alignmentLines(db, studyId, person, alignmentId)
  const row = db.select({ groupSize: alignments.groupSize, engineVersion: alignments.engineVersion, reference: alignments.reference }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!line || !row) throw notFound()
  const sizes = unpackInt32(row.groupSize)
  const groupSizes = new Array<number>(line.tables).fill(0)
  for (const size of sizes) groupSizes[size - 1] = (groupSizes[size - 1] ?? 0) + 1
  return { ...line, engineVersion: row.engineVersion, reference: row.reference, groupSizes, aligned: alignedTables(db, alignmentId, sizes) }
}

function alignedTables(db: Database, alignmentId: string, sizes: Int32Array): AlignedTable[] {
  const rows = db.select({ part: alignmentTables, fileName: tables.fileName, columnName: tables.columnName, features: tables.features }).from(alignmentTables)
    .innerJoin(tables, eq(tables.id, alignmentTables.tableId)).where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
  return rows.map(({ part, fileName, columnName, features }) => {
    const shift = unpackFloat64(part.driftShift)
    let matched = 0
    unpackInt32(part.member).forEach((member, group) => {
      if (member >= 0 && (sizes[group] ?? 0) > 1) matched++
    })
    return {
      tableId: part.tableId, sampleName: part.sampleName, fileName: columnName ? `${fileName}, ${columnName}` : fileName, digest: part.tableDigest, features, matched,
      leftOut: part.leftOutRow.byteLength / 4, offsetPpm: part.offsetPpm, offsetApplied: part.offsetApplied, timeCorrected: part.timeCorrected, landmarks: part.landmarks, reason: part.driftReason,
      drift: [...unpackFloat64(part.driftMinutes)].map((minutes, knot): [number, number] => [minutes, shift[knot] ?? 0]),
      residualMedianPpm: part.residualMedianPpm, residualMedianMinutes: part.residualMedianMinutes,
    }
  })
}
