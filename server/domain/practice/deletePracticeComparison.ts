import { and, eq } from 'drizzle-orm'
import { canSeeWork } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { comparisons } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'

/** Deletes one's own practice comparison with all its versions. Official work stays, whoever asks. */
export function deletePracticeComparison(db: Database, studyId: string, comparisonId: string, person: Person): { id: string } {
  return db.transaction((tx) => {
    const comparison = tx.select().from(comparisons).where(and(eq(comparisons.id, comparisonId), eq(comparisons.studyId, studyId))).get()
    if (!comparison || !canSeeWork(person, comparison)) throw notFound()
    if (!comparison.practice) throw new DomainError('forbidden', 'Official comparisons are kept: later work and its reasons rest on them.')
    tx.delete(comparisons).where(eq(comparisons.id, comparison.id)).run()
    record(tx, { personId: person.id, action: 'delete practice comparison', studyId, subjectId: comparison.id })
    return { id: comparison.id }
  })
}
