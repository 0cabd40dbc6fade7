import { studyFormSchema } from '../../../../shared/schemas/study'
import { editStudy } from '../../../domain/study/editStudy'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event, 'editStudy')
  return editStudy(db, study, await readInput(event, studyFormSchema), person)
})
