import { eq } from 'drizzle-orm'
import type { StudyFormInput, StudyInput } from '../../../shared/schemas/study'
import type { Database } from '../../db/open'
import { studies, studyMembers } from '../../db/schema'
import { record } from '../activity/record'
import { chosenMethod } from '../method/chosenMethod'
import type { Person } from '../person/person'
import type { VisibleStudy } from './findVisibleStudy'

/** Changes what a study says of itself. Who restricts it is a member from then on, so that they don't lock themselves out. */
export function editStudy(db: Database, study: VisibleStudy, input: StudyInput | StudyFormInput, person: Person): { id: string } {
  return db.transaction((tx) => {
    const { title, question, matrix, sideAName, sideBName, restricted } = input
    const next = { title, question, matrix, sideAName, sideBName, restricted, methodId: chosenMethod(tx, input, person) }
    tx.update(studies).set({ ...next, lastActivityAt: new Date() }).where(eq(studies.id, study.id)).run()
    if (restricted && !study.restricted) tx.insert(studyMembers).values({ studyId: study.id, personId: person.id }).onConflictDoNothing().run()
    const changed = (Object.keys(next) as (keyof typeof next)[]).filter(name => next[name] !== study[name])
    record(tx, { personId: person.id, action: 'edit study', studyId: study.id, subjectId: study.id, detail: changed.join(', ') })
    return { id: study.id }
  })
}
