import type { Database } from '../../db/open'
import { tracedNames, type TracedContent } from './traceDifferences'
import { tracesToUse } from './tracesToUse'

/** What of the traces is otherwise now than when a version was saved, as sentences; empty where it looked into just those that stand. */
export function traceChanges(db: Database, { alignmentId, samples, traces }: TracedContent & { alignmentId: string }): string[] {
  const standing = new Map(tracesToUse(db, alignmentId, samples).map(trace => [trace.position, trace]))
  const used = new Set(traces.map(({ position }) => position))
  const cameIn = [...standing.values()].filter(({ position }) => !used.has(position))
  const replaced = traces.filter(({ position, traceId }) => standing.has(position) && standing.get(position)?.traceId !== traceId)
  const takenOff = traces.filter(({ position }) => !standing.has(position))
  return [
    ...(cameIn.length > 0 ? [`Not looked into here: the ${cameIn.length === 1 ? 'trace' : 'traces'} of ${tracedNames(samples, cameIn)}.`] : []),
    ...(replaced.length > 0 ? [`Replaced since: the ${replaced.length === 1 ? 'trace' : 'traces'} of ${tracedNames(samples, replaced)}.`] : []),
    ...(takenOff.length > 0 ? [`Taken off since: the ${takenOff.length === 1 ? 'trace' : 'traces'} of ${tracedNames(samples, takenOff)}.`] : []),
  ]
}
