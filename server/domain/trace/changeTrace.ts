import { and, eq, isNull, ne } from 'drizzle-orm'
import type { TraceChange } from '../../../shared/schemas/trace'
import type { Database } from '../../db/open'
import { traces } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import { sampleOfStudy } from '../sample/sampleOfStudy'
import { touchStudy } from '../study/touchStudy'

/** Sets the sample that a trace belongs to. A sample has one trace at a time. */
export function changeTrace(db: Database, studyId: string, traceId: string, { sampleId }: TraceChange, person: Person): { id: string } {
  return db.transaction(() => {
    const trace = db.select({ fileName: traces.fileName, replacedAt: traces.replacedAt }).from(traces).where(and(eq(traces.id, traceId), eq(traces.studyId, studyId))).get()
    if (!trace) throw notFound()
    if (trace.replacedAt) throw new DomainError('conflict', 'This trace is out of use: it stays as it is, with the versions that used it.')
    if (sampleId !== null) {
      const sample = sampleOfStudy(db, studyId, sampleId)
      const other = db.select({ fileName: traces.fileName }).from(traces).where(and(eq(traces.sampleId, sampleId), isNull(traces.replacedAt), ne(traces.id, traceId))).get()
      if (other) throw new DomainError('conflict', `“${sample.name}” has a trace already, ${other.fileName}. Give that one another sample first, or replace it.`, [{ field: 'sampleId', sentence: `“${sample.name}” has a trace already.` }])
    }
    db.update(traces).set({ sampleId }).where(eq(traces.id, traceId)).run()
    record(db, { personId: person.id, action: 'edit trace', studyId, subjectId: traceId, detail: trace.fileName })
    touchStudy(db, studyId)
    return { id: traceId }
  }, { behavior: 'immediate' })
}
