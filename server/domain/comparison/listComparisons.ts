import { and, desc, eq, isNull, or, sql } from 'drizzle-orm'
import type { ComparisonLine } from '../../../shared/types/comparison'
import type { Database } from '../../db/open'
import { comparisons, people } from '../../db/schema'
import type { Person } from '../person/person'
import { versionLines } from './versionLine'

/** The comparisons of a study that the person may see, newest first: official ones and their own practice copies. */
export function listComparisons(db: Database, studyId: string, person: Person): ComparisonLine[] {
  const rows = db.select({ comparison: comparisons, createdByName: people.name }).from(comparisons)
    .innerJoin(people, eq(people.id, comparisons.createdBy))
    .where(and(eq(comparisons.studyId, studyId), isNull(comparisons.archivedAt), or(eq(comparisons.practice, false), eq(comparisons.createdBy, person.id))))
    .orderBy(desc(comparisons.createdAt), desc(sql`${comparisons}.rowid`)).all()
  const lines = versionLines(db, rows.map(({ comparison }) => comparison.id))
  return rows.flatMap(({ comparison, createdByName }) => {
    const versions = lines.get(comparison.id) ?? []
    const latest = versions.at(-1)
    return latest
      ? [{ id: comparison.id, title: comparison.title, practice: comparison.practice, createdByName, createdAt: comparison.createdAt.toISOString(), versions: versions.length, latest }]
      : []
  })
}
