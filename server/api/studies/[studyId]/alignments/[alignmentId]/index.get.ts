import { readAlignment } from '../../../../../domain/alignment/readAlignment'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  return readAlignment(db, study.id, readParam(event, 'alignmentId'), person)
})
