import { listComparisons } from '../../../../domain/comparison/listComparisons'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return listComparisons(db, study.id, person)
})
