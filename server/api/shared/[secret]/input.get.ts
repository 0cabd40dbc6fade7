import { sharedData } from '../../../domain/share/sharedData'

export default defineRoute((event) => {
  const { db, link } = requireShareLink(event)
  const packed = sharedData(db, link)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packed
})
