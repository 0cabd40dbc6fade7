import { removeTable } from '../../../../../domain/table/removeTable'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'editStudy')
  return removeTable(db, useLaboratory().folder, study.id, readParam(event, 'tableId'), person)
})
