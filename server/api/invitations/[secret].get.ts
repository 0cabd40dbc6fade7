import { findInvitation } from '../../domain/person/invitations'

/** Whom a one-time link is for. Looking at it does not use it up. */
export default defineRoute((event) => {
  const { name, signInName, hasPassword } = findInvitation(useLaboratory().db, readParam(event, 'secret'))
  return { name, signInName, hasPassword }
})
