import { closePerson } from '../../../domain/person/managePerson'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'managePeople')
  return closePerson(db, readParam(event, 'personId'), person)
})
