import { asc, eq, inArray } from 'drizzle-orm'
import { correctScans } from '../../../shared/science/traces/correctScans'
import type { AlignedScans } from '../../../shared/science/traces/highestSignals'
import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { unpackFloat64 } from '../../db/packed'
import { alignmentTables, traces } from '../../db/schema'
import { tracesByPosition } from './tracesByPosition'

/** One sample's trace as an alignment sees it. */
export interface AlignedTrace extends UsedTrace, Omit<AlignedScans, 'centroidsBetween'> {
  sampleName: string
}

/**
 * The traces that stand now for the samples of an alignment, in the order of its tables; samples without one are not in it.
 * Whoever calls has looked at the right to see the alignment.
 */
export function standingTraces(db: Database, alignmentId: string): AlignedTrace[] {
  return usedTraces(db, alignmentId, tracesByPosition(db, alignmentId))
}

/** The traces that a version of a comparison used, whether they still stand or not; those that are gone are not in it. */
export function usedTraces(db: Database, alignmentId: string, used: readonly UsedTrace[]): AlignedTrace[] {
  if (used.length === 0) return []
  const places = new Map(tablePlaces(db, alignmentId).map(place => [place.position, place]))
  const rows = new Map(db.select(brief).from(traces).where(inArray(traces.id, used.map(({ traceId }) => traceId))).all().map(row => [row.id, row]))
  return used.flatMap(({ position, traceId }) => {
    const [place, trace] = [places.get(position), rows.get(traceId)]
    return place && trace ? [alignedTrace(place, trace)] : []
  })
}

const brief = {
  id: traces.id, fileName: traces.fileName, sha256: traces.sha256, minutes: traces.minutes,
  lowestMz: traces.lowestMz, highestMz: traces.highestMz, intensityLimit: traces.intensityLimit,
}

function tablePlaces(db: Database, alignmentId: string) {
  const { position, sampleName, offsetPpm, offsetApplied, driftMinutes, driftShift } = alignmentTables
  return db.select({ position, sampleName, offsetPpm, offsetApplied, driftMinutes, driftShift }).from(alignmentTables)
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(position)).all()
}

type Place = ReturnType<typeof tablePlaces>[number]
type TraceRow = Pick<typeof traces.$inferSelect, keyof typeof brief>

function alignedTrace(place: Place, trace: TraceRow): AlignedTrace {
  const { fileName, sha256, lowestMz, highestMz, intensityLimit } = trace
  return {
    position: place.position, sampleName: place.sampleName, traceId: trace.id, fileName, sha256, lowestMz, highestMz, intensityLimit,
    scanMinutes: correctScans(unpackFloat64(trace.minutes), { knotMinutes: unpackFloat64(place.driftMinutes), knotShiftMinutes: unpackFloat64(place.driftShift) }),
    offsetPpm: place.offsetApplied ? place.offsetPpm : 0,
  }
}
