import { eq } from 'drizzle-orm'
import { newComparisonSchema } from '../../../shared/schemas/comparison'
import { comparisons } from '../../db/schema'
import { prepareComparison } from '../comparison/prepareComparison'
import type { Person } from '../person/person'
import { findVisibleStudy } from '../study/findVisibleStudy'
import { awaitJobs } from './awaitJobs'
import type { DemoPlace } from './makeDemo'
import type { DemoStudy } from './studies'

/** The study's first comparison at default limits, made now where it has none. */
export async function compareDemoStudy({ db, jobs }: DemoPlace, { comparisonTitle: title }: DemoStudy, studyId: string, alignmentId: string, scientist: Person, signal: AbortSignal) {
  const standing = () => db.select({ id: comparisons.id }).from(comparisons).where(eq(comparisons.studyId, studyId)).get()
  await awaitJobs(db, studyId, signal)
  if (standing()) return
  const input = prepareComparison(db, findVisibleStudy(db, studyId, scientist), newComparisonSchema.parse({ alignmentId, title }), scientist)
  jobs.add({ kind: 'compare', studyId, input, personId: scientist.id })
  await awaitJobs(db, studyId, signal)
  if (!standing()) throw new Error(`${title} was not made; the study's last job says why.`)
}
