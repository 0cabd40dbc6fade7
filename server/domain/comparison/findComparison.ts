import { and, desc, eq, getTableColumns } from 'drizzle-orm'
import { canSeeWork } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { comparisons, comparisonVersions } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'

/** A comparison of the study that the person may see; another's practice copy looks as if it were not there. */
export function findComparison(db: Database, studyId: string, comparisonId: string, person: Person) {
  const comparison = db.select().from(comparisons).where(and(eq(comparisons.id, comparisonId), eq(comparisons.studyId, studyId))).get()
  if (!comparison || !canSeeWork(person, comparison)) throw notFound()
  return comparison
}

const { columns: _, ...withoutColumns } = getTableColumns(comparisonVersions)

/** A version by its number, else the latest; without its packed columns. */
export function findVersion(db: Database, comparisonId: string, number?: number) {
  const version = db.select(withoutColumns).from(comparisonVersions)
    .where(and(eq(comparisonVersions.comparisonId, comparisonId), number === undefined ? undefined : eq(comparisonVersions.number, number)))
    .orderBy(desc(comparisonVersions.number)).limit(1).get()
  if (!version) throw notFound()
  return version
}
export type FoundVersion = ReturnType<typeof findVersion>
