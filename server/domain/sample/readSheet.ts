import { and, asc, count, eq, isNull } from 'drizzle-orm'
import type { SampleRow, SampleSheet } from '../../../shared/types/sample'
import type { Database } from '../../db/open'
import { samples, tables } from '../../db/schema'

/** The sample sheet of a study, in its order. */
export function readSheet(db: Pick<Database, 'select'>, studyId: string): SampleSheet {
  const standing = new Map(db.select({ sampleId: tables.sampleId, count: count() }).from(tables)
    .where(and(eq(tables.studyId, studyId), isNull(tables.replacedAt))).groupBy(tables.sampleId).all()
    .map(row => [row.sampleId, row.count]))
  const rows = db.select().from(samples).where(eq(samples.studyId, studyId)).orderBy(asc(samples.position), asc(samples.createdAt)).all()
  return {
    samples: rows.map(({ id, name, kind, side, preparation, amount, amountUnit, volumeMl, dilution, injectionUl, runOrder, batch }): SampleRow =>
      ({ id, name, kind, side, preparation, amount, amountUnit, volumeMl, dilution, injectionUl, runOrder, batch, tables: standing.get(id) ?? 0 })),
  }
}
