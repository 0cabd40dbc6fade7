import { versionQuerySchema } from '../../../../../../shared/schemas/comparison'
import { readComparisonData } from '../../../../../domain/comparison/comparisonData'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { version } = readQueryInput(event, versionQuerySchema)
  const packed = readComparisonData(db, study.id, readParam(event, 'comparisonId'), person, version)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packed
})
