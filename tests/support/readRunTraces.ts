import { and, eq } from 'drizzle-orm'
import type { RunTraces } from '../../shared/science/traces/gatherTraces'
import type { Database } from '../../server/db/open'
import { unpackFloat64 } from '../../server/db/packed'
import { traces } from '../../server/db/schema'

/** Total and base peak trace of one sample's raw data, in the order of time; also of a trace that is out of use. */
export function readRunTraces(db: Database, studyId: string, traceId: string): RunTraces {
  const row = db.select({ minutes: traces.minutes, total: traces.total, base: traces.base }).from(traces).where(and(eq(traces.id, traceId), eq(traces.studyId, studyId))).get()
  if (!row) throw new Error('There is no such trace.')
  return { minutes: unpackFloat64(row.minutes), total: unpackFloat64(row.total), base: unpackFloat64(row.base) }
}
