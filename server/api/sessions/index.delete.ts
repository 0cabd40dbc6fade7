import { endSession } from '../../domain/session/sessions'

export default defineRoute(async (event) => {
  const { db } = await requirePerson(event)
  const { secure } = await getUserSession(event)
  if (secure?.sid) endSession(db, secure.sid)
  await clearUserSession(event)
  return { signedOut: true }
})
