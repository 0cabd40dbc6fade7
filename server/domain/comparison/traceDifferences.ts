import { counted } from '../../../shared/science/numeric/numberWords'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'

export interface TracedContent { samples: readonly ComparedSample[], traces: readonly UsedTrace[] }

/** What two versions looked into otherwise, as sentences. */
export function traceDifferences(before: TracedContent, after: TracedContent): string[] {
  const were = new Set(before.traces.map(({ traceId }) => traceId))
  const are = new Set(after.traces.map(({ traceId }) => traceId))
  const added = after.traces.filter(({ traceId }) => !were.has(traceId))
  const gone = before.traces.filter(({ traceId }) => !are.has(traceId))
  if (added.length === 0 && gone.length === 0) return []
  if (were.size === 0) return [`Traces of ${counted(are.size, 'sample')} were looked into.`]
  if (are.size === 0) return ['Traces were not looked into any more.']
  return [
    ...(added.length > 0 ? [`Other traces were looked into, of ${tracedNames(after.samples, added)}.`] : []),
    ...(gone.length > 0 ? [`No longer looked into: ${gone.map(({ fileName }) => fileName).sort().join(', ')}.`] : []),
  ]
}

/** The samples of these traces, by name. */
export function tracedNames(samples: readonly ComparedSample[], traces: readonly UsedTrace[]): string {
  return traces.flatMap(({ position }) => samples[position]?.name ?? []).sort().join(', ')
}
