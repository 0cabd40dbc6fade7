import { sharedExtractQuerySchema } from '../../../../shared/schemas/comparison'
import { sharedExtracted } from '../../../domain/share/sharedTraces'

export default defineRoute((event) => {
  const { link } = requireShareLink(event)
  const { features } = readQueryInput(event, sharedExtractQuerySchema)
  return extractInTurn(event, `guest ${link.versionId}`, signal => sharedExtracted(useLaboratory(), link, features, signal))
})
