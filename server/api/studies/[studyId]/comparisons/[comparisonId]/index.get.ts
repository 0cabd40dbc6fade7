import { versionQuerySchema } from '../../../../../../shared/schemas/comparison'
import { readComparison } from '../../../../../domain/comparison/readComparison'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { version } = readQueryInput(event, versionQuerySchema)
  return readComparison(db, study.id, readParam(event, 'comparisonId'), person, version)
})
