import { readSheet } from '../../../../domain/sample/readSheet'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event)
  return readSheet(db, study.id)
})
