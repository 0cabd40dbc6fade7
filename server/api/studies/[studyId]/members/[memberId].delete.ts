import { removeMember } from '../../../../domain/study/members'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event, 'editStudy')
  return removeMember(db, study, readParam(event, 'memberId'), person)
})
