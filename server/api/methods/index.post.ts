import { methodSchema } from '../../../shared/schemas/method'
import { makeMethod } from '../../domain/method/makeMethod'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'editStudy')
  return makeMethod(db, await readInput(event, methodSchema), person)
})
