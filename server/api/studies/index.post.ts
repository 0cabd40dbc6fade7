import { studyFormSchema } from '../../../shared/schemas/study'
import { makeStudy } from '../../domain/study/makeStudy'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'editStudy')
  return makeStudy(db, await readInput(event, studyFormSchema), person)
})
