import { versionColumns } from '../../../domain/comparison/readVersion'

/** The columns go out as they are stored: packed and gzipped. */
export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  const columns = versionColumns(db, link.versionId)
  setResponseHeaders(event, { 'content-type': 'application/octet-stream', 'content-encoding': 'gzip' })
  return columns
})
