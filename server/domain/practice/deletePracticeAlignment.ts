import { eq, inArray } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { alignments, comparisons, comparisonVersions } from '../../db/schema'
import { record } from '../activity/record'
import { findVisibleAlignment } from '../alignment/findVisibleAlignment'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'

/** Deletes one's own practice alignment, with the practice comparisons that rest on it and its flags. Official work stays, whoever asks. */
export function deletePracticeAlignment(db: Database, studyId: string, alignmentId: string, person: Person): { id: string } {
  return db.transaction((tx) => {
    const alignment = findVisibleAlignment(tx, studyId, alignmentId, person)
    if (!alignment.practice) throw new DomainError('forbidden', 'Official alignments are kept: comparisons rest on them.')
    const resting = tx.selectDistinct({ id: comparisonVersions.comparisonId }).from(comparisonVersions).where(eq(comparisonVersions.alignmentId, alignment.id)).all()
    tx.delete(comparisons).where(inArray(comparisons.id, resting.map(row => row.id))).run()
    tx.delete(alignments).where(eq(alignments.id, alignment.id)).run()
    const detail = resting.length === 0 ? '' : `with ${resting.length} ${resting.length === 1 ? 'comparison' : 'comparisons'}`
    record(tx, { personId: person.id, action: 'delete practice alignment', studyId, subjectId: alignment.id, detail })
    return { id: alignment.id }
  })
}
