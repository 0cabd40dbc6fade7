import { archiveStudy } from '../../../domain/study/archiveStudy'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event, 'archive')
  return archiveStudy(db, study, false, person)
})
