import { renewLink } from '../../../domain/person/managePerson'

/** The answer holds the one-time link, which is shown this once. */
export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'managePeople')
  const { id, secret } = renewLink(db, readParam(event, 'personId'), person)
  return { id, link: linkTo(event, `/invitation/${secret}`) }
})
