import { and, eq } from 'drizzle-orm'
import { canSeeWork } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { alignments } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'

/** What an alignment is, without its packed columns. */
export interface VisibleAlignment { id: string, studyId: string, number: number, practice: boolean, groups: number, createdBy: string }

/** An alignment of a study the person may see, if they may see it too: a practice run is its maker's alone. Throws notFound otherwise. */
export function findVisibleAlignment(db: Pick<Database, 'select'>, studyId: string, alignmentId: string, person: Person): VisibleAlignment {
  const { id, number, practice, groups, createdBy } = alignments
  const row = db.select({ id, studyId: alignments.studyId, number, practice, groups, createdBy }).from(alignments)
    .where(and(eq(alignments.id, alignmentId), eq(alignments.studyId, studyId))).get()
  if (!row || !canSeeWork(person, row)) throw notFound()
  return row
}
