import { studyView } from '../../../domain/study/studyView'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event)
  return studyView(db, study, person)
})
