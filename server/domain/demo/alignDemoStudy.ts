import { and, asc, eq } from 'drizzle-orm'
import { newAlignmentSchema } from '../../../shared/schemas/alignment'
import { alignments } from '../../db/schema'
import { planAlignment } from '../alignment/planAlignment'
import type { Person } from '../person/person'
import { awaitJobs } from './awaitJobs'
import type { DemoPlace } from './makeDemo'
import type { DemoStudy } from './studies'

/** The study's first alignment at default settings, made now where it has none; a wide file's rows are taken as given. Gives its id. */
export async function alignDemoStudy({ db, jobs }: DemoPlace, { fileStyle }: DemoStudy, studyId: string, analyst: Person, signal: AbortSignal): Promise<string> {
  const standing = () => db.select({ id: alignments.id }).from(alignments).where(and(eq(alignments.studyId, studyId), eq(alignments.practice, false))).orderBy(asc(alignments.number)).get()?.id
  await awaitJobs(db, studyId, signal)
  const before = standing()
  if (before) return before
  const input = planAlignment(db, studyId, newAlignmentSchema.parse({ settings: {}, asGiven: fileStyle === 'wide' }), analyst)
  jobs.add({ kind: 'align', studyId, input, personId: analyst.id })
  await awaitJobs(db, studyId, signal)
  const made = standing()
  if (!made) throw new Error('The demo\'s tables could not be aligned; the study\'s last job says why.')
  return made
}
