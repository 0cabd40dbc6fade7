import { listAlignments } from '../../../../domain/alignment/listAlignments'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return listAlignments(db, study.id, person)
})
