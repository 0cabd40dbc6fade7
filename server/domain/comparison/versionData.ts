import type { ComparisonData } from '../../../shared/formats/comparisonData'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { UsedTrace } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { readTraceMaxima } from '../trace/traceMaxima'
import { alignmentData } from './alignmentData'
import { readSamples } from './storedSample'

/** All that a version was judged from but its settings. Whoever calls has looked at the right to see it. */
export function versionData(db: Database, { alignmentId, samples, traces }: { alignmentId: string, samples: readonly ComparedSample[], traces: readonly UsedTrace[] }): ComparisonData {
  const maxima = readTraceMaxima(db, alignmentId, traces)
  return { ...alignmentData(db, alignmentId), samples: readSamples(samples), traceMaxima: samples.map((_, position) => maxima.get(position) ?? null) }
}
