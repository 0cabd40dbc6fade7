import { newPasswordSchema } from '../../../shared/schemas/person'
import { acceptInvitation, findInvitation } from '../../domain/person/invitations'

export default defineRoute(async (event) => {
  const { db } = useLaboratory()
  const secret = readParam(event, 'secret')
  findInvitation(db, secret)
  const { password } = await readInput(event, newPasswordSchema)
  return beginSession(event, await acceptInvitation(db, secret, password, passwordHasher))
})
