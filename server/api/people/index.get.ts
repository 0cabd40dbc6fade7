import { listPeople } from '../../domain/person/listPeople'

export default defineRoute(async (event) => {
  const { db } = await requirePerson(event, 'managePeople')
  return listPeople(db)
})
