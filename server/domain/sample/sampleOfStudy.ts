import { and, eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { samples } from '../../db/schema'
import { DomainError } from '../DomainError'

/** The sample that a person has chosen; a sentence where it is not in the study. */
export function sampleOfStudy(db: Database, studyId: string, sampleId: string): { name: string } {
  const sample = db.select({ name: samples.name }).from(samples).where(and(eq(samples.id, sampleId), eq(samples.studyId, studyId))).get()
  if (!sample) throw new DomainError('invalid', 'That sample is not in the sheet any more.', [{ field: 'sampleId', sentence: 'Choose a sample of this study.' }])
  return sample
}
