import { Readable } from 'node:stream'
import { sharedCsv } from '../../../domain/share/sharedCsv'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  const { fileName, chunks } = sharedCsv(db, link)
  setDownload(event, fileName, 'text/csv; charset=utf-8')
  return sendDownload(event, Readable.from(chunks))
})
