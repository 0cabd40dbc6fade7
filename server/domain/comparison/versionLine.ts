import { asc, eq, inArray } from 'drizzle-orm'
import type { VersionLine } from '../../../shared/types/comparison'
import type { Verdict } from '../../../shared/science/verdict/verdicts'
import type { Database } from '../../db/open'
import { alignments, comparisonVersions, people } from '../../db/schema'

/** The versions of these comparisons as lists show them, oldest first. */
export function versionLines(db: Database, comparisonIds: string[]): Map<string, VersionLine[]> {
  const { comparisonId, number, alignmentId, sideAName, sideBName, counts, differs, createdAt } = comparisonVersions
  const rows = db.select({ comparisonId, number, alignmentId, sideAName, sideBName, counts, differs, createdAt, alignmentNumber: alignments.number, createdByName: people.name })
    .from(comparisonVersions)
    .innerJoin(alignments, eq(alignments.id, comparisonVersions.alignmentId))
    .innerJoin(people, eq(people.id, comparisonVersions.createdBy))
    .where(inArray(comparisonVersions.comparisonId, comparisonIds)).orderBy(asc(number)).all()
  const lines = new Map<string, VersionLine[]>(comparisonIds.map(id => [id, []]))
  for (const { comparisonId: of, counts: stored, createdAt: at, ...row } of rows) {
    lines.get(of)?.push({ ...row, counts: stored as Record<Verdict, number>, createdAt: at.toISOString() })
  }
  return lines
}
