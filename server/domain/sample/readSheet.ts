import { and, asc, count, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import { sampleFields } from '../../../shared/schemas/sample'
import type { SampleRow, SampleSheet } from '../../../shared/types/sample'
import type { Database } from '../../db/open'
import { alignments, alignmentTables, people, samples, tables } from '../../db/schema'

type Reader = Pick<Database, 'select' | 'selectDistinct'>
export type StoredSample = typeof samples.$inferSelect

/** The sample sheet of a study, in its order, with what stands on each sample and who wrote its cells. */
export function readSheet(db: Reader, studyId: string): SampleSheet {
  const rows = readRows(db, studyId)
  const standing = new Map(db.select({ sampleId: tables.sampleId, count: count() }).from(tables)
    .where(and(eq(tables.studyId, studyId), isNull(tables.replacedAt))).groupBy(tables.sampleId).all()
    .map(row => [row.sampleId, row.count]))
  const aligned = alignedSamples(db, studyId)
  const names = namesOf(db, rows)
  return { samples: rows.map(row => sampleRow(row, standing.get(row.id) ?? 0, aligned.has(row.id), names)) }
}

export function readRows(db: Reader, studyId: string): StoredSample[] {
  return db.select().from(samples).where(eq(samples.studyId, studyId)).orderBy(asc(samples.position), asc(samples.createdAt)).all()
}

/** The samples that an alignment of the study holds, whoever made it. */
export function alignedSamples(db: Reader, studyId: string): Set<string | null> {
  return new Set(db.selectDistinct({ sampleId: alignmentTables.sampleId }).from(alignmentTables)
    .innerJoin(alignments, eq(alignments.id, alignmentTables.alignmentId))
    .where(and(eq(alignments.studyId, studyId), isNotNull(alignmentTables.sampleId))).all().map(row => row.sampleId))
}

/** The names behind the ids in `writtenBy`. */
export function namesOf(db: Reader, rows: readonly StoredSample[]): Map<string, string> {
  const ids = [...new Set(rows.flatMap(row => Object.values(row.writtenBy)))]
  return new Map(db.select({ id: people.id, name: people.name }).from(people).where(inArray(people.id, ids)).all().map(({ id, name }) => [id, name]))
}

function sampleRow(row: StoredSample, tables: number, aligned: boolean, names: Map<string, string>): SampleRow {
  const { id, name, kind, side, preparation, amount, amountUnit, volumeMl, dilution, injectionUl, runOrder, batch } = row
  const writtenBy: SampleRow['writtenBy'] = {}
  for (const field of sampleFields) {
    const writer = names.get(row.writtenBy[field] ?? '')
    if (writer) writtenBy[field] = writer
  }
  return { id, name, kind, side, preparation, amount, amountUnit, volumeMl, dilution, injectionUl, runOrder, batch, tables, aligned, writtenBy }
}
