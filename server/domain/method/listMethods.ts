import { and, asc, eq, isNotNull, isNull, or } from 'drizzle-orm'
import type { MethodListItem } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { methods, studies, studyMembers } from '../../db/schema'
import type { Person } from '../person/person'
import { methodOf } from './methodOf'

/** All methods by name, each with the studies that use it and that the person may see. */
export function listMethods(db: Database, person: Person): MethodListItem[] {
  const using = db.select({ id: studies.id, title: studies.title, methodId: studies.methodId }).from(studies)
    .leftJoin(studyMembers, and(eq(studyMembers.studyId, studies.id), eq(studyMembers.personId, person.id)))
    .where(or(eq(studies.restricted, false), isNotNull(studyMembers.personId)))
    .orderBy(asc(studies.title)).all()
  return db.select().from(methods).where(isNull(methods.archivedAt)).orderBy(asc(methods.name)).all().map(method => ({
    ...methodOf(method),
    studies: using.filter(study => study.methodId === method.id).map(({ id, title }) => ({ id, title })),
  }))
}
