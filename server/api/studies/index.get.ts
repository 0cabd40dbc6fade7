import { studyListQuerySchema } from '../../../shared/schemas/study'
import { listStudies } from '../../domain/study/listStudies'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event, 'readStudy')
  return listStudies(db, readQueryInput(event, studyListQuerySchema), person)
})
