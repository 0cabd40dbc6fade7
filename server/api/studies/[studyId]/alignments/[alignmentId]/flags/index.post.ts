import { flagSchema } from '../../../../../../../shared/schemas/flag'
import { addFlags } from '../../../../../../domain/flag/addFlags'
import { requireFlagRight } from '../../../../../../domain/flag/requireFlagRight'
import { findVisibleAlignment } from '../../../../../../domain/alignment/findVisibleAlignment'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const alignment = findVisibleAlignment(db, study.id, readParam(event, 'alignmentId'), person)
  requireFlagRight(study, alignment, person)
  return addFlags(db, alignment, await readInput(event, flagSchema), person)
})
