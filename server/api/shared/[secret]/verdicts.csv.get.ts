import { Readable } from 'node:stream'
import { sharedCsv } from '../../../domain/share/sharedCsv'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  const { fileName, chunks } = sharedCsv(db, link)
  setResponseHeaders(event, { 'content-type': 'text/csv; charset=utf-8', 'content-disposition': `attachment; filename="${fileName}"` })
  return sendDownload(event, Readable.from(chunks))
})
