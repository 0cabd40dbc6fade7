import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { jobs } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { findVisibleStudy } from '../study/findVisibleStudy'

/** A job, for the person who started it or, where it belongs to a study, for those who see that study and it is no practice run. */
export function findJob(db: Database, jobId: string, person: Person) {
  const job = db.select().from(jobs).where(eq(jobs.id, jobId)).get()
  if (!job) throw notFound()
  if (job.createdBy === person.id) return job
  if (!job.studyId || isPractice(job.input)) throw notFound()
  findVisibleStudy(db, job.studyId, person)
  return job
}

/** Does the job do practice work, for the eyes of its maker alone? */
export function isPractice(input: unknown): boolean {
  return typeof input === 'object' && input !== null && 'practice' in input && input.practice === true
}
