import { sharedExtractQuerySchema } from '../../../../shared/schemas/comparison'
import { sharedExtracted } from '../../../domain/share/sharedTraces'

export default defineRoute(async (event) => {
  const { link } = requireShareLink(event)
  const { features } = readQueryInput(event, sharedExtractQuerySchema)
  const packed = await sharedExtracted(useLaboratory(), link, features)
  setResponseHeader(event, 'content-type', 'application/octet-stream')
  return packed
})
