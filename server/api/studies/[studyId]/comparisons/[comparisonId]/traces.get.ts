import { versionQuerySchema } from '../../../../../../shared/schemas/comparison'
import { comparisonTraces } from '../../../../../domain/comparison/comparisonTraces'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { version } = readQueryInput(event, versionQuerySchema)
  const packed = comparisonTraces(db, study.id, readParam(event, 'comparisonId'), person, version)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packed
})
