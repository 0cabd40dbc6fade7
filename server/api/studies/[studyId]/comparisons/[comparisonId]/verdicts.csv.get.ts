import { Readable } from 'node:stream'
import { versionQuerySchema } from '../../../../../../shared/schemas/comparison'
import { verdictCsv } from '../../../../../domain/comparison/verdictCsv'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { version } = readQueryInput(event, versionQuerySchema)
  const { fileName, chunks } = verdictCsv(db, study, readParam(event, 'comparisonId'), person, version)
  setDownload(event, fileName, 'text/csv; charset=utf-8')
  return sendDownload(event, Readable.from(chunks))
})
