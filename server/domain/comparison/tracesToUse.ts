import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { tracesByPosition } from '../trace/tracesByPosition'

/** The traces that stand now for what can be compared: samples, on a side or not, but no blanks, pooled QCs and standards. */
export function tracesToUse(db: Database, alignmentId: string, samples: readonly ComparedSample[]): UsedTrace[] {
  return tracesByPosition(db, alignmentId).filter(({ position }) => samples[position]?.kind === 'sample')
}

interface Wanted {
  alignmentId: string
  samples: readonly ComparedSample[]
  useTraces: boolean | undefined
}

/** The traces of a new version: those that stand, none, or (not said) as the version it starts from; on another alignment again those that stand. */
export function tracesFrom(db: Database, from: { alignmentId: string, traces: UsedTrace[] }, { alignmentId, samples, useTraces }: Wanted): UsedTrace[] {
  if (useTraces === undefined && (from.alignmentId === alignmentId || from.traces.length === 0)) return from.traces
  return useTraces === false ? [] : tracesToUse(db, alignmentId, samples)
}
