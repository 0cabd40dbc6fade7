import { listTables } from '../../../../domain/table/listTables'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event)
  return listTables(db, study.id)
})
