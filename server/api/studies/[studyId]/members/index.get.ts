import { readMembers } from '../../../../domain/study/members'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event)
  return readMembers(db, study, person)
})
