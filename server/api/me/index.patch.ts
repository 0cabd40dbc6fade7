import { profileSchema } from '../../../shared/schemas/person'
import { editProfile } from '../../domain/person/ownAccount'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event)
  return editProfile(db, await readInput(event, profileSchema), person)
})
