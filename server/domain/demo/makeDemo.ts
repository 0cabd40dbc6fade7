import { eq, isNull, and } from 'drizzle-orm'
import type { Role } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { people, personRoles } from '../../db/schema'
import type { Jobs } from '../../jobs/runner'
import type { Person } from '../person/person'
import { alignDemoStudy } from './alignDemoStudy'
import { compareDemoStudy } from './compareDemoStudy'
import { demoIsWanted, markDemoMade } from './demoProgress'
import { flagDemoStory } from './flagDemoStory'
import { sendDemoFiles } from './sendDemoFiles'
import { sendDemoTraces } from './sendDemoTraces'
import { startDemoStudy } from './startDemoStudy'
import { demoStudies, type DemoStudy } from './studies'

export interface DemoPlace { db: Database, folder: string, jobs: Jobs }

/**
 * Makes the demo laboratory's studies by the same acts as a person: study, sheet, files, alignment, comparison, flags. Each step looks
 * for what stands already, so a start after a killed one goes on where that ended. Does nothing where the demo is made, or unwanted.
 *
 * @param tell told what is being done, in words for the page
 * @param signal aborted when the server stops
 */
export async function makeDemo(place: DemoPlace, tell: (now: string) => void, signal: AbortSignal): Promise<void> {
  const { db } = place
  if (!demoIsWanted(db)) return
  const analyst = personWith(db, 'analyst')
  const scientist = personWith(db, 'scientist')
  if (!analyst || !scientist) return
  const made: { study: DemoStudy, studyId: string, alignmentId: string }[] = []
  for (const [index, study] of demoStudies.entries()) {
    const now = (what: string) => tell(`${what} study ${index + 1} of ${demoStudies.length}, “${study.study.title}”`)
    now('Writing the sample sheet of')
    const studyId = startDemoStudy(db, study, analyst)
    now('Reading the tables of')
    await sendDemoFiles(place, study, studyId, analyst, signal)
    now('Reading the raw data of')
    await sendDemoTraces(place, study, studyId, analyst, signal)
    now('Aligning the tables of')
    const alignmentId = await alignDemoStudy(place, study, studyId, analyst, signal)
    now('Comparing the sides of')
    await compareDemoStudy(place, study, studyId, alignmentId, scientist, signal)
    made.unshift({ study, studyId, alignmentId })
  }
  // The first study last: lists show what was changed last on top, and it is the one to begin with.
  for (const { study, studyId, alignmentId } of made) flagDemoStory(db, study, studyId, alignmentId, scientist)
  markDemoMade(db)
}

/** Whoever has this role and an open account: in a demo laboratory, the demo account that was made first. */
function personWith(db: Database, role: Role): Person | null {
  const { id, name, signInName } = people
  const row = db.select({ id, name, signInName }).from(people).innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(personRoles.role, role), isNull(people.closedAt))).orderBy(people.createdAt).get()
  return row ? { ...row, roles: db.select().from(personRoles).where(eq(personRoles.personId, row.id)).all().map(held => held.role) } : null
}
