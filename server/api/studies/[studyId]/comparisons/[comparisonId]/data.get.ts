import { versionQuerySchema } from '../../../../../../shared/schemas/comparison'
import { findComparison, findVersion } from '../../../../../domain/comparison/findComparison'
import { versionColumns } from '../../../../../domain/comparison/readVersion'

/** The columns go out as they are stored: packed and gzipped. */
export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { version } = readQueryInput(event, versionQuerySchema)
  const comparison = findComparison(db, study.id, readParam(event, 'comparisonId'), person)
  const columns = versionColumns(db, findVersion(db, comparison.id, version).id)
  setResponseHeaders(event, { 'content-type': 'application/octet-stream', 'content-encoding': 'gzip' })
  return columns
})
