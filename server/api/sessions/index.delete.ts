import { signOut } from '../../domain/session/sessions'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event)
  const secret = await readSessionSecret(event)
  if (secret) signOut(db, secret, person)
  await clearUserSession(event)
  return { signedOut: true }
})
