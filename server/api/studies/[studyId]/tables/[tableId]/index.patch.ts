import { tableChangeSchema } from '../../../../../../shared/schemas/table'
import { changeTable } from '../../../../../domain/table/changeTable'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'editStudy')
  const change = await readInput(event, tableChangeSchema)
  return changeTable(db, study.id, readParam(event, 'tableId'), change, person)
})
