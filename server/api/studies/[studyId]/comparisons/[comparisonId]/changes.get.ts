import { changesQuerySchema } from '../../../../../../shared/schemas/comparison'
import { compareVersions } from '../../../../../domain/comparison/compareVersions'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return compareVersions(db, study.id, readParam(event, 'comparisonId'), readQueryInput(event, changesQuerySchema), person)
})
