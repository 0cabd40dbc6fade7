import { can } from '../../../shared/permissions'
import { DomainError } from '../../domain/DomainError'
import { findJob } from '../../domain/job/findJob'

export default defineRoute(async (event) => {
  const { db, person } = await requirePerson(event)
  const job = findJob(db, readParam(event, 'jobId'), person)
  if (job.createdBy !== person.id && !can(person, 'editStudy')) throw new DomainError('forbidden', 'Only the person who started it or an analyst can cancel it.')
  useLaboratory().jobs.cancel(job.id)
  return { id: job.id }
})
