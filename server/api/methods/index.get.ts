import { listMethods } from '../../domain/method/listMethods'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'readStudy')
  return { methods: listMethods(db, person) }
})
