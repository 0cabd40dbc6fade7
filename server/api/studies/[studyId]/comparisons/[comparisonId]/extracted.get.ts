import { extractQuerySchema } from '../../../../../../shared/schemas/comparison'
import { comparisonExtracted } from '../../../../../domain/comparison/comparisonTraces'

export default defineRoute(async (event) => {
  const { person, study } = await requireStudy(event)
  const query = readQueryInput(event, extractQuerySchema)
  return extractInTurn(event, person.id, signal => comparisonExtracted(useLaboratory(), study.id, readParam(event, 'comparisonId'), person, query, signal))
})
