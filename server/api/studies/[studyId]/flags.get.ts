import { flaggedFeatures } from '../../../domain/flag/flaggedFeatures'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return flaggedFeatures(db, study.id, person)
})
