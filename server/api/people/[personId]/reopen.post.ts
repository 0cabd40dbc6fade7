import { reopenPerson } from '../../../domain/person/managePerson'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'managePeople')
  return reopenPerson(db, readParam(event, 'personId'), person)
})
