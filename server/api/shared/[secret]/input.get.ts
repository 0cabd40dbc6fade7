import { sharedData } from '../../../domain/share/sharedData'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packInTurn(event, link.versionId, () => sharedData(db, link))
})
