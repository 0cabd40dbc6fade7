import { and, count, eq, isNull, or } from 'drizzle-orm'
import type { StudyCounts } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { alignments, comparisons, samples, tables, traces } from '../../db/schema'
import type { Person } from '../person/person'

/** What stands in each study (or in one): replaced tables and traces, archived comparisons and others' practice work are not counted. */
export function studyCounts(db: Database, person: Person, studyId?: string): (studyId: string) => StudyCounts {
  const within = (column: typeof samples.studyId | typeof tables.studyId | typeof traces.studyId | typeof alignments.studyId | typeof comparisons.studyId) => studyId ? eq(column, studyId) : undefined
  const found = {
    samples: db.select({ studyId: samples.studyId, count: count() }).from(samples)
      .where(within(samples.studyId)).groupBy(samples.studyId).all(),
    tables: db.select({ studyId: tables.studyId, count: count() }).from(tables)
      .where(and(within(tables.studyId), isNull(tables.replacedAt))).groupBy(tables.studyId).all(),
    traces: db.select({ studyId: traces.studyId, count: count() }).from(traces)
      .where(and(within(traces.studyId), isNull(traces.replacedAt))).groupBy(traces.studyId).all(),
    alignments: db.select({ studyId: alignments.studyId, count: count() }).from(alignments)
      .where(and(within(alignments.studyId), or(eq(alignments.practice, false), eq(alignments.createdBy, person.id)))).groupBy(alignments.studyId).all(),
    comparisons: db.select({ studyId: comparisons.studyId, count: count() }).from(comparisons)
      .where(and(within(comparisons.studyId), isNull(comparisons.archivedAt), or(eq(comparisons.practice, false), eq(comparisons.createdBy, person.id)))).groupBy(comparisons.studyId).all(),
  }
  const of = (rows: { studyId: string, count: number }[]) => new Map(rows.map(row => [row.studyId, row.count]))
  const by = { samples: of(found.samples), tables: of(found.tables), traces: of(found.traces), alignments: of(found.alignments), comparisons: of(found.comparisons) }
  return id => ({
    samples: by.samples.get(id) ?? 0,
    tables: by.tables.get(id) ?? 0,
    traces: by.traces.get(id) ?? 0,
    alignments: by.alignments.get(id) ?? 0,
    comparisons: by.comparisons.get(id) ?? 0,
  })
}
