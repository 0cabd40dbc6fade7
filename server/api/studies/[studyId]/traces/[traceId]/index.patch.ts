import { traceChangeSchema } from '../../../../../../shared/schemas/trace'
import { changeTrace } from '../../../../../domain/trace/changeTrace'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'editStudy')
  const change = await readInput(event, traceChangeSchema)
  return changeTrace(db, study.id, readParam(event, 'traceId'), change, person)
})
