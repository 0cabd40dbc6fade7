import { readSharedComparison } from '../../../domain/share/readSharedComparison'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  return readSharedComparison(db, link)
})
