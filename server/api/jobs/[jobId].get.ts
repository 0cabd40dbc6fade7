import { findJob } from '../../domain/job/findJob'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event)
  const { id, kind, status, progress, message, resultId } = findJob(db, readParam(event, 'jobId'), person)
  return { id, kind, status, progress, message, resultId }
})
