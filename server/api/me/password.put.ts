import { passwordChangeSchema } from '../../../shared/schemas/person'
import { changePassword } from '../../domain/person/ownAccount'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event)
  const input = await readInput(event, passwordChangeSchema)
  const from = attemptSource(event, person.signInName)
  return beginSession(event, await changePassword(db, input, person, { hasher: passwordHasher, attempts, from }))
})
