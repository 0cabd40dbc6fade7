import { sharedTraces } from '../../../domain/share/sharedTraces'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packInTurn(event, link.versionId, () => sharedTraces(db, link))
})
