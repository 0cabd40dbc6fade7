import { removeTrace } from '../../../../../domain/trace/removeTrace'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'editStudy')
  return removeTrace(db, useLaboratory().folder, study.id, readParam(event, 'traceId'), person)
})
