import { firstSchema } from '../../shared/schemas/person'
import { notFound } from '../domain/DomainError'
import { makeFirstLabLead } from '../domain/person/firstLabLead'
import { hasPeople } from '../domain/person/listPeople'

/** The first lab lead of a new laboratory; once there is an account, there is nothing here. */
export default defineRoute(async (event) => {
  const { db } = useLaboratory()
  if (hasPeople(db)) throw notFound()
  const input = await readInput(event, firstSchema)
  return beginSession(event, await makeFirstLabLead(db, input, { hasher: passwordHasher, attempts, address: socketAddress(event) }))
})
