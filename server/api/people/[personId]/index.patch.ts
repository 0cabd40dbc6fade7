import { personEditSchema } from '../../../../shared/schemas/person'
import { editPerson } from '../../../domain/person/managePerson'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'managePeople')
  return editPerson(db, readParam(event, 'personId'), await readInput(event, personEditSchema), person)
})
