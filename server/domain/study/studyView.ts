import { eq } from 'drizzle-orm'
import type { StudyView } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { methods, people } from '../../db/schema'
import { methodOf } from '../method/methodOf'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from './findVisibleStudy'
import { studyCounts } from './studyCounts'
import { membersOf } from './studyPeople'

/** A study with its method, its members and what stands in it. */
export function studyView(db: Database, study: VisibleStudy, person: Person): StudyView {
  const { id, title, question, matrix, sideAName, sideBName, restricted } = study
  const method = db.select().from(methods).where(eq(methods.id, study.methodId)).get()
  const creator = db.select({ name: people.name }).from(people).where(eq(people.id, study.createdBy)).get()
  if (!method || !creator) throw notFound()
  return {
    id, title, question, matrix, sideAName, sideBName, restricted,
    method: methodOf(method),
    createdAt: study.createdAt.toISOString(),
    createdByName: creator.name,
    lastActivityAt: study.lastActivityAt.toISOString(),
    archivedAt: study.archivedAt?.toISOString() ?? null,
    counts: studyCounts(db, person, id)(id),
    members: membersOf(db, id),
  }
}
