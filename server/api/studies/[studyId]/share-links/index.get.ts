import { listShareLinks } from '../../../../domain/share/listShareLinks'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'share')
  return listShareLinks(db, study.id)
})
