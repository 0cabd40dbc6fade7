import { findRefusedRows } from '../../../../../domain/table/refusedRows'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event)
  return findRefusedRows(db, study.id, readParam(event, 'tableId'))
})
