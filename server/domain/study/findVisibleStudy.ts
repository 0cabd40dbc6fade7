import { and, eq } from 'drizzle-orm'
import { canSeeStudy } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { studies, studyMembers } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'

export type VisibleStudy = typeof studies.$inferSelect

/** The study, if the person may see it: restricted ones are seen by members alone. Throws notFound otherwise. */
export function findVisibleStudy(db: Database, studyId: string, person: Person): VisibleStudy {
  const row = db.select({ study: studies, member: studyMembers.personId }).from(studies)
    .leftJoin(studyMembers, and(eq(studyMembers.studyId, studies.id), eq(studyMembers.personId, person.id)))
    .where(eq(studies.id, studyId)).get()
  if (!row || !canSeeStudy(person, { restricted: row.study.restricted, isMember: row.member !== null })) throw notFound()
  return row.study
}
