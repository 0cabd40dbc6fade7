import { withdrawShareLink } from '../../../../domain/share/withdrawShareLink'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'share', { archivedToo: true })
  return withdrawShareLink(db, study.id, readParam(event, 'shareLinkId'), person)
})
