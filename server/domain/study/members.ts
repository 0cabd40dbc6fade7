import { and, eq, isNull } from 'drizzle-orm'
import { can } from '../../../shared/permissions'
import type { StudyMembers } from '../../../shared/types/study'
import type { Database } from '../../db/open'
import { people, studyMembers } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from './findVisibleStudy'
import { membersOf, othersOf } from './studyPeople'
import { touchStudy } from './touchStudy'

/** Who is a member; and, for those who may add, who else has an account. */
export function readMembers(db: Database, study: VisibleStudy, person: Person): StudyMembers {
  return { members: membersOf(db, study.id), others: can(person, 'editStudy') ? othersOf(db, study.id) : [] }
}

/** Adds a person with an open account. A member already: nothing changes. */
export function addMember(db: Database, study: VisibleStudy, memberId: string, person: Person): StudyMembers {
  const member = db.select({ name: people.name }).from(people).where(and(eq(people.id, memberId), isNull(people.closedAt))).get()
  if (!member) throw notFound()
  db.transaction((tx) => {
    const { changes } = tx.insert(studyMembers).values({ studyId: study.id, personId: memberId }).onConflictDoNothing().run()
    if (changes === 0) return
    touchStudy(tx, study.id)
    record(tx, { personId: person.id, action: 'add member', studyId: study.id, subjectId: memberId, detail: member.name })
  })
  return readMembers(db, study, person)
}

/** Takes a member out. A restricted study keeps one who may edit it, or nobody could ever open it to others again. */
export function removeMember(db: Database, study: VisibleStudy, memberId: string, person: Person): StudyMembers {
  db.transaction((tx) => {
    const members = membersOf(tx, study.id)
    const member = members.find(each => each.id === memberId)
    if (!member) throw notFound()
    const remaining = members.filter(each => each.id !== memberId && !each.closed)
    if (study.restricted && !remaining.some(each => can(each, 'editStudy'))) {
      throw new DomainError('conflict', `${member.name} is the last member who may edit this restricted study. Add another analyst or lab lead first.`)
    }
    tx.delete(studyMembers).where(and(eq(studyMembers.studyId, study.id), eq(studyMembers.personId, memberId))).run()
    touchStudy(tx, study.id)
    record(tx, { personId: person.id, action: 'remove member', studyId: study.id, subjectId: memberId, detail: member.name })
  })
  // Who took themselves out of a restricted study sees it no longer.
  if (study.restricted && memberId === person.id) return { members: [], others: [] }
  return readMembers(db, study, person)
}
