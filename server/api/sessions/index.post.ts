import { signInSchema } from '../../../shared/schemas/person'
import { signIn } from '../../domain/session/signIn'

export default defineRoute(async (event) => {
  const input = await readInput(event, signInSchema)
  const from = attemptSource(event, input.signInName)
  return beginSession(event, await signIn(useLaboratory().db, input, { hasher: passwordHasher, attempts, from }))
})
