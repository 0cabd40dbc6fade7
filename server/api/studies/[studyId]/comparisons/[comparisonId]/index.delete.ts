import { deletePracticeComparison } from '../../../../../domain/practice/deletePracticeComparison'

/** One's own practice copy; official ones are refused. */
export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return deletePracticeComparison(db, study.id, readParam(event, 'comparisonId'), person)
})
