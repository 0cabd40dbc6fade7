import { signInSchema } from '../../../shared/schemas/person'
import { signIn } from '../../domain/session/signIn'

export default defineRoute(async (event) => {
  const input = await readInput(event, signInSchema)
  const { personId, secret } = await signIn(useLaboratory().db, input, passwordHasher)
  await clearUserSession(event)
  await setUserSession(event, { user: { id: personId }, secure: { sid: secret } })
  return { id: personId }
})
