import { and, count, eq, inArray } from 'drizzle-orm'
import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { packFloat64, unpackFloat64 } from '../../db/packed'
import { traceMaxima, traces } from '../../db/schema'
import { DomainError } from '../DomainError'

/** The highest signal of every aligned feature in one trace. */
export interface TraceMaxima { traceId: string, maxima: Float64Array }

/** What was found in these traces on an alignment, by the position of their samples; traces that nobody has looked into there are not in it. */
export function readTraceMaxima(db: Database, alignmentId: string, used: readonly UsedTrace[]): Map<number, Float64Array> {
  if (used.length === 0) return new Map()
  const rows = db.select({ traceId: traceMaxima.traceId, maxima: traceMaxima.maxima }).from(traceMaxima)
    .where(and(eq(traceMaxima.alignmentId, alignmentId), inArray(traceMaxima.traceId, used.map(({ traceId }) => traceId)))).all()
  const found = new Map(rows.map(({ traceId, maxima }) => [traceId, maxima]))
  return new Map(used.flatMap(({ position, traceId }) => {
    const maxima = found.get(traceId)
    return maxima ? [[position, unpackFloat64(maxima)] as const] : []
  }))
}

/** Keeps what was found in traces; what another job has kept meanwhile is the same and stays. @throws DomainError where a trace is gone */
export function keepTraceMaxima(db: Database, alignmentId: string, found: readonly TraceMaxima[]) {
  for (const { traceId, maxima } of found) {
    if (!db.select({ id: traces.id }).from(traces).where(eq(traces.id, traceId)).get()) throw traceGone()
    db.insert(traceMaxima).values({ alignmentId, traceId, maxima: packFloat64(maxima) }).onConflictDoNothing().run()
  }
}

/**
 * What a version rests on must be there when it is kept: these traces, and what was found in them on its alignment.
 * @throws DomainError where a trace was taken off meanwhile
 */
export function requireTraceMaxima(db: Database, alignmentId: string, used: readonly UsedTrace[]) {
  const traceIds = used.map(({ traceId }) => traceId)
  const kept = db.select({ kept: count() }).from(traceMaxima).where(and(eq(traceMaxima.alignmentId, alignmentId), inArray(traceMaxima.traceId, traceIds))).get()?.kept
  if (kept !== traceIds.length) throw traceGone()
}

export const traceGone = () => new DomainError('conflict', 'A trace that was to be looked into was taken off meanwhile. Start again: it takes the traces that stand then.')
