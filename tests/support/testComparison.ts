import { eq } from 'drizzle-orm'
import type { OpenDatabase } from '../../server/db/open'
import { comparisons, comparisonVersions } from '../../server/db/schema'
import { comparisonDefaults } from '../../shared/science/verdict/settings'

/** A comparison of an alignment, without versions. */
export function addTestComparison({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, { practice = false, title = 'Millrace against Tallow Lane' } = {}) {
  return db.insert(comparisons).values({ studyId, createdBy, practice, title }).returning().get()
}

/** The next version of a comparison, with no verdicts in it: for tests of what points to a version. */
export function addTestVersion({ db }: Pick<OpenDatabase, 'db'>, comparison: { id: string, studyId: string, createdBy: string }, alignmentId: string) {
  const number = db.select().from(comparisonVersions).where(eq(comparisonVersions.comparisonId, comparison.id)).all().length + 1
  return db.insert(comparisonVersions).values({
    comparisonId: comparison.id, studyId: comparison.studyId, alignmentId, number, sideAName: 'A', sideBName: 'B', settings: comparisonDefaults,
    samples: [], engineVersion: 'test', counts: {}, columns: Buffer.alloc(0), createdBy: comparison.createdBy,
  }).returning().get()
}
