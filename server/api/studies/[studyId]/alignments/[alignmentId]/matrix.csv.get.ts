import { Readable } from 'node:stream'
import { matrixCsv } from '../../../../../domain/alignment/matrixCsv'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const { fileName, chunks } = matrixCsv(db, study, readParam(event, 'alignmentId'), person)
  setDownload(event, fileName, 'text/csv; charset=utf-8')
  return sendDownload(event, Readable.from(chunks))
})
