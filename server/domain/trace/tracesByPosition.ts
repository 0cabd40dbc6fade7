import { and, asc, eq, isNull } from 'drizzle-orm'
import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { alignmentTables, traces } from '../../db/schema'

/** The trace that stands now for each sample of an alignment, in the order of its tables, without its columns; samples without one are not in it. */
export function tracesByPosition(db: Database, alignmentId: string): UsedTrace[] {
  return db.select({ position: alignmentTables.position, traceId: traces.id, fileName: traces.fileName, sha256: traces.sha256 }).from(alignmentTables)
    .innerJoin(traces, and(eq(traces.sampleId, alignmentTables.sampleId), isNull(traces.replacedAt)))
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
}
