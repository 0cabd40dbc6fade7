import { ownProfile } from '../../domain/person/ownAccount'
import { hasPeople } from '../../domain/person/listPeople'

/** Who is signed in, or null; whether this is a demo laboratory; and whether it still waits for its first account. */
export default defineRoute(async (event) => {
  const { db, kind } = useLaboratory()
  const person = await readPerson(event)
  return { person: person && { ...person, ...ownProfile(db, person) }, demo: kind === 'demo', first: !person && kind === 'lab' && !hasPeople(db) }
})
