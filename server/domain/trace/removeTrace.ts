import { and, eq, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { traces } from '../../db/schema'
import { record } from '../activity/record'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { touchStudy } from '../study/touchStudy'
import { retireTrace } from './retireTrace'

/** Takes a trace out of use. One that a version of a comparison looked into stays beside that version; `retired` says so. */
export function removeTrace(db: Database, folder: string, studyId: string, traceId: string, person: Person): { id: string, retired: boolean } {
  return db.transaction(() => {
    const trace = db.select({ id: traces.id, studyId: traces.studyId, fileName: traces.fileName }).from(traces).where(and(eq(traces.id, traceId), eq(traces.studyId, studyId), isNull(traces.replacedAt))).get()
    if (!trace) throw notFound()
    const done = retireTrace(db, folder, trace)
    record(db, { personId: person.id, action: 'remove trace', studyId, subjectId: traceId, detail: trace.fileName })
    touchStudy(db, studyId)
    return { id: traceId, retired: done === 'retired' }
  }, { behavior: 'immediate' })
}
