import { and, asc, count, countDistinct, desc, eq, inArray, or } from 'drizzle-orm'
import type { AlignmentLine, AlignmentList } from '../../../shared/types/alignment'
import type { Database } from '../../db/open'
import { alignments, alignmentTables, comparisons, comparisonVersions, jobs, people } from '../../db/schema'
import { isPractice } from '../job/findJob'
import type { Person } from '../person/person'
import { alignableTables } from './alignableTables'

/** A study's alignments, newest first: the official ones, and one's own practice runs. */
export function listAlignments(db: Database, studyId: string, person: Person): AlignmentList {
  return { alignments: alignmentLines(db, studyId, person), ready: alignableTables(db, studyId), jobs: openRuns(db, studyId, person) }
}

export function alignmentLines(db: Database, studyId: string, person: Person, alignmentId?: string): AlignmentLine[] {
  const { id, number, practice, asGiven, settings, differs, groups, createdAt } = alignments
  const rows = db.select({ id, number, practice, asGiven, settings, differs, groups, createdAt, createdByName: people.name }).from(alignments)
    .innerJoin(people, eq(people.id, alignments.createdBy))
    .where(and(eq(alignments.studyId, studyId), or(eq(alignments.practice, false), eq(alignments.createdBy, person.id)), alignmentId ? eq(alignments.id, alignmentId) : undefined))
    .orderBy(desc(alignments.number)).all()
  const ids = rows.map(row => row.id)
  const tablesOf = new Map(db.select({ id: alignmentTables.alignmentId, n: count() }).from(alignmentTables).where(inArray(alignmentTables.alignmentId, ids)).groupBy(alignmentTables.alignmentId).all().map(row => [row.id, row.n]))
  const comparisonsOf = new Map(db.select({ id: comparisonVersions.alignmentId, n: countDistinct(comparisonVersions.comparisonId) }).from(comparisonVersions)
    .innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId))
    .where(and(inArray(comparisonVersions.alignmentId, ids), or(eq(comparisons.practice, false), eq(comparisons.createdBy, person.id)))).groupBy(comparisonVersions.alignmentId).all().map(row => [row.id, row.n]))
  return rows.map(row => ({ ...row, tables: tablesOf.get(row.id) ?? 0, comparisons: comparisonsOf.get(row.id) ?? 0, createdAt: row.createdAt.toISOString() }))
}

function openRuns(db: Database, studyId: string, person: Person): AlignmentList['jobs'] {
  return db.select().from(jobs).where(and(eq(jobs.studyId, studyId), eq(jobs.kind, 'align'), inArray(jobs.status, ['queued', 'running']))).orderBy(asc(jobs.createdAt)).all()
    .map(job => ({ job, practice: isPractice(job.input) }))
    .filter(({ job, practice }) => !practice || job.createdBy === person.id)
    .map(({ job, practice }) => ({ id: job.id, message: job.message, progress: job.progress, practice }))
}
