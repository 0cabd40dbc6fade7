import { flagChangeSchema } from '../../../../../../../shared/schemas/flag'
import { findVisibleAlignment } from '../../../../../../domain/alignment/findVisibleAlignment'
import { changeFlags } from '../../../../../../domain/flag/changeFlags'
import { requireFlagRight } from '../../../../../../domain/flag/requireFlagRight'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const alignment = findVisibleAlignment(db, study.id, readParam(event, 'alignmentId'), person)
  requireFlagRight(study, alignment, person)
  return changeFlags(db, alignment, await readInput(event, flagChangeSchema), person)
})
