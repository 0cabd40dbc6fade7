import { sheetChangesSchema } from '../../../../../shared/schemas/sheet'
import { editSheet } from '../../../../domain/sample/editSheet'

export default defineRoute(async (event) => {
  const { db, study, person } = await requireStudy(event, 'editStudy')
  return editSheet(db, study.id, await readInput(event, sheetChangesSchema), person)
})
