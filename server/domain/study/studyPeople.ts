import { asc, eq, inArray, isNull } from 'drizzle-orm'
import type { StudyMember } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { people, personRoles, studyMembers } from '../../db/schema'

/** The members of a study, by name; closed accounts too, for the record. */
export function membersOf(db: Database, studyId: string): StudyMember[] {
  return withRoles(db, db.select({ id: people.id, name: people.name }).from(people)
    .innerJoin(studyMembers, eq(studyMembers.personId, people.id))
    .where(eq(studyMembers.studyId, studyId)).orderBy(asc(people.name)).all())
}

/** People with an open account who are no members yet. */
export function othersOf(db: Database, studyId: string): StudyMember[] {
  const members = new Set(membersOf(db, studyId).map(member => member.id))
  const open = db.select({ id: people.id, name: people.name }).from(people).where(isNull(people.closedAt)).orderBy(asc(people.name)).all()
  return withRoles(db, open.filter(person => !members.has(person.id)))
}

function withRoles(db: Database, found: { id: string, name: string }[]): StudyMember[] {
  const rows = db.select().from(personRoles).where(inArray(personRoles.personId, found.map(person => person.id))).all()
  return found.map(person => ({ ...person, roles: rows.filter(row => row.personId === person.id).map(row => row.role) }))
}
