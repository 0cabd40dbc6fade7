import { drawFromFeatures, gridMinutes, gridOver } from '#shared/science/traces/drawFromFeatures'
import { meanTrace, type TraceLine } from '#shared/science/traces/meanTrace'
import type { ComparedSample } from '#shared/science/verdict/settings'
import type { TraceKind, TraceScale } from '~/utils/traceView'

/** A trace of one compared sample, in counts. */
export interface SampleLine extends TraceLine {
  side: 'A' | 'B'
  sampleName: string
  /** Factor to normalised counts. */
  factor: number
  /** The feature whose m/z was extracted; null: total or base peak. */
  feature: number | null
}

/** A line to draw: a sample's, or the mean of a side. */
export interface Curve extends TraceLine {
  side: 'A' | 'B'
  /** Null: the mean of the side. */
  sampleName: string | null
  feature: number | null
}

/** A compared sample and its place among the samples of the version. */
export interface DrawnSample { position: number, side: 'A' | 'B', sampleName: string, factor: number }

/** The samples that are drawn: those compared, in the order of the version. `factors` are those of the comparison, NaN where not compared. */
export function drawnSamples(samples: readonly Pick<ComparedSample, 'name' | 'side'>[], factors: Float64Array): DrawnSample[] {
  return samples.flatMap(({ name, side }, position) => {
    const factor = factors[position] ?? Number.NaN
    return side !== null && factor > 0 ? [{ position, side, sampleName: name, factor }] : []
  })
}

/** One sample's lines drawn from features: one of all of them, or one a feature looked at. */
export function linesFromFeatures({ position, ...sample }: DrawnSample, data: { retentionMinutes: Float64Array, intensity: readonly Float64Array[] }, kind: TraceKind, looked: readonly number[]): SampleLine[] {
  const heights = data.intensity[position]
  if (!heights) return []
  const grid = gridOver(data.retentionMinutes)
  const minutes = gridMinutes(grid)
  const features = { minutes: data.retentionMinutes, heights }
  if (kind !== 'extracted') return [{ ...sample, feature: null, minutes, values: drawFromFeatures(features, grid, kind === 'total' ? 'sum' : 'highest') }]
  return looked.map(feature => ({ ...sample, feature, minutes, values: drawFromFeatures(features, grid, 'sum', Int32Array.of(feature)) }))
}

/** Scales the lines and adds the mean of each side, of each feature where several are extracted: samples first, so that means lie on top. */
export function scaledCurves(lines: readonly SampleLine[], scale: TraceScale): Curve[] {
  const samples = lines.map(({ side, sampleName, feature, minutes, values, factor }): Curve => {
    const highest = highestOf(values)
    const by = scale === 'normalised' ? factor : highest > 0 ? 100 / highest : 1
    return { side, sampleName, feature, minutes, values: values.map(value => value * by) }
  })
  const features = [...new Set(samples.map(({ feature }) => feature))]
  const means = features.flatMap(feature => (['A', 'B'] as const).flatMap((side): Curve[] => {
    const own = samples.filter(curve => curve.side === side && curve.feature === feature)
    return own.length > 0 ? [{ side, sampleName: null, feature, ...meanTrace(own) }] : []
  }))
  return [...samples, ...means]
}

/** The highest value; 0 where none is above it. */
export function highestOf(values: Float64Array, from = 0, to = values.length): number {
  let highest = 0
  for (let i = from; i < to; i++) if (values[i]! > highest) highest = values[i]!
  return highest
}

/** From the first to the last point of all lines, minutes; null where there is none. */
export function runOf(lines: readonly TraceLine[]): [number, number] | null {
  const measured = lines.filter(({ minutes }) => minutes.length > 0)
  if (measured.length === 0) return null
  return [Math.min(...measured.map(({ minutes }) => minutes[0]!)), Math.max(...measured.map(({ minutes }) => minutes[minutes.length - 1]!))]
}
