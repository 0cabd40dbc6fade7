import { personSchema } from '../../../shared/schemas/person'
import { addPerson } from '../../domain/person/addPerson'

/** The answer holds the one-time link, which is shown this once. */
export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'managePeople')
  const { id, secret } = addPerson(db, await readInput(event, personSchema), person)
  return { id, link: linkTo(event, `/invitation/${secret}`) }
})
