import { deletePracticeAlignment } from '../../../../../domain/practice/deletePracticeAlignment'

/** One's own practice run; official ones are refused. */
export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return deletePracticeAlignment(db, study.id, readParam(event, 'alignmentId'), person)
})
