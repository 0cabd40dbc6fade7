import { canFlagWork } from '../../../../../../../shared/permissions'
import { findVisibleAlignment } from '../../../../../../domain/alignment/findVisibleAlignment'
import { listFlags } from '../../../../../../domain/flag/listFlags'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event)
  const alignment = findVisibleAlignment(db, study.id, readParam(event, 'alignmentId'), person)
  return { flags: listFlags(db, alignment.id), mayFlag: !study.archivedAt && canFlagWork(person, alignment) }
})
