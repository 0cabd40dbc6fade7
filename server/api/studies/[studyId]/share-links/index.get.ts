import { listShareLinks } from '../../../../domain/share/listShareLinks'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'share', { archivedToo: true })
  return listShareLinks(db, study.id)
})
