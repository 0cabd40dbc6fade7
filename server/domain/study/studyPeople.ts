import { asc, eq, inArray, isNull } from 'drizzle-orm'
import type { StudyMember } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { people, personRoles, studyMembers } from '../../db/schema'

type Reader = Pick<Database, 'select'>
interface Found { id: string, name: string, closedAt: Date | null }

const columns = { id: people.id, name: people.name, closedAt: people.closedAt }

/** The members of a study, by name; closed accounts too, and said to be. */
export function membersOf(db: Reader, studyId: string): StudyMember[] {
  return withRoles(db, db.select(columns).from(people)
    .innerJoin(studyMembers, eq(studyMembers.personId, people.id))
    .where(eq(studyMembers.studyId, studyId)).orderBy(asc(people.name)).all())
}

/** People with an open account who are no members yet. */
export function othersOf(db: Reader, studyId: string): StudyMember[] {
  const members = new Set(membersOf(db, studyId).map(member => member.id))
  const open = db.select(columns).from(people).where(isNull(people.closedAt)).orderBy(asc(people.name)).all()
  return withRoles(db, open.filter(person => !members.has(person.id)))
}

function withRoles(db: Reader, found: Found[]): StudyMember[] {
  const rows = db.select().from(personRoles).where(inArray(personRoles.personId, found.map(person => person.id))).all()
  return found.map(({ id, name, closedAt }) => ({ id, name, closed: closedAt !== null, roles: rows.filter(row => row.personId === id).map(row => row.role) }))
}
