import { and, eq, sql } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { comparisonVersions, traces, uploads } from '../../db/schema'
import { releaseTraceFiles } from './traceFiles'

/** Versions of comparisons that looked into each trace of a study. */
export function versionsByTrace(db: Database, studyId: string): Map<string, number> {
  const used = db.select({ traces: comparisonVersions.traces }).from(comparisonVersions).where(and(eq(comparisonVersions.studyId, studyId), sql`${comparisonVersions.traces} <> '[]'`)).all()
  const counts = new Map<string, number>()
  for (const version of used) for (const traceId of new Set(version.traces.map(trace => trace.traceId))) counts.set(traceId, (counts.get(traceId) ?? 0) + 1)
  return counts
}

/** Takes a trace away: one that a version used stays and is marked, for that version's sake; any other goes with its files. */
export function retireTrace(db: Database, folder: string, trace: { id: string, studyId: string }): 'retired' | 'removed' {
  if (versionsByTrace(db, trace.studyId).has(trace.id)) {
    db.update(traces).set({ replacedAt: new Date() }).where(eq(traces.id, trace.id)).run()
    return 'retired'
  }
  db.delete(traces).where(eq(traces.id, trace.id)).run()
  db.delete(uploads).where(and(eq(uploads.id, trace.id), eq(uploads.status, 'read'))).run()
  releaseTraceFiles(db, folder, trace.id)
  return 'removed'
}
