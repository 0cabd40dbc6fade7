import { and, desc, eq, getTableColumns, isNotNull, or } from 'drizzle-orm'
import { can } from '../../../shared/permissions'
import type { StudyListQuery } from '../../../shared/schemas/study'
import type { StudyList } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { methods, studies, studyMembers } from '../../db/schema'
import type { Person } from '../person/person'
import { studyCounts } from './studyCounts'

/** The studies a person may see, last changed first; those in which every word of the search occurs. */
export function listStudies(db: Database, query: StudyListQuery, person: Person): StudyList {
  if (!can(person, 'readStudy')) return { studies: [], archived: 0 }
  const seen = db.select({ ...getTableColumns(studies), methodName: methods.name }).from(studies)
    .innerJoin(methods, eq(methods.id, studies.methodId))
    .leftJoin(studyMembers, and(eq(studyMembers.studyId, studies.id), eq(studyMembers.personId, person.id)))
    .where(or(eq(studies.restricted, false), isNotNull(studyMembers.personId)))
    .orderBy(desc(studies.lastActivityAt), studies.title).all()
  const words = query.search.toLowerCase().split(/\s+/).filter(Boolean)
  const fitting = seen.filter((study) => {
    const text = [study.title, study.question, study.matrix, study.methodName].join('\n').toLowerCase()
    return words.every(word => text.includes(word))
  })
  const countsOf = studyCounts(db, person)
  return {
    studies: fitting.filter(study => query.archived || !study.archivedAt).map(({ id, title, question, matrix, methodName, restricted, lastActivityAt, archivedAt }) => ({
      id, title, question, matrix, methodName, restricted,
      lastActivityAt: lastActivityAt.toISOString(),
      archivedAt: archivedAt?.toISOString() ?? null,
      counts: countsOf(id),
    })),
    archived: fitting.filter(study => study.archivedAt).length,
  }
}
