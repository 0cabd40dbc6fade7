import { methodSchema } from '../../../shared/schemas/method'
import { editMethod } from '../../domain/method/editMethod'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'editStudy')
  return editMethod(db, readParam(event, 'methodId'), await readInput(event, methodSchema), person)
})
