import type { StudyFormInput, StudyInput } from '../../../shared/schemas/study'
import type { Database } from '../../db/open'
import { studies, studyMembers } from '../../db/schema'
import { record } from '../activity/record'
import { chosenMethod } from '../method/chosenMethod'
import type { Person } from '../person/person'

/** Makes a study, with a new method where the input has one. Who makes it is its first member. */
export function makeStudy(db: Database, input: StudyInput | StudyFormInput, person: Person): { id: string } {
  return db.transaction((tx) => {
    const { title, question, matrix, sideAName, sideBName, restricted } = input
    const methodId = chosenMethod(tx, input, person)
    const { id } = tx.insert(studies).values({ title, question, matrix, sideAName, sideBName, restricted, methodId, createdBy: person.id }).returning({ id: studies.id }).get()
    tx.insert(studyMembers).values({ studyId: id, personId: person.id }).run()
    record(tx, { personId: person.id, action: 'make study', studyId: id, subjectId: id, detail: title })
    return { id }
  })
}
