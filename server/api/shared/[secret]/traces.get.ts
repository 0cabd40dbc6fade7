import { sharedTraces } from '../../../domain/share/sharedTraces'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  const packed = sharedTraces(db, link)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packed
})
