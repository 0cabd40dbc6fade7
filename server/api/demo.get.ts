import { notFound } from '../domain/DomainError'

/** How far the making of the demo laboratory is; a real one has nothing here. */
export default defineRoute(async (event) => {
  await requirePerson(event)
  if (useLaboratory().kind !== 'demo') throw notFound()
  return demoState()
})
