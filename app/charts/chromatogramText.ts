import { firstNotBelow } from '#shared/science/numeric/firstPlace'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { counted } from '#shared/science/numeric/numberWords'
import type { Curve } from '~/charts/chromatogramCurves'
import { formatIntensity, formatMinutes } from '~/utils/formatMeasures'
import type { TimeWindow, TraceKind, TraceOrigin, TraceScale } from '~/utils/traceView'

const KIND_NAMES: Record<TraceKind, string> = { total: 'total (TIC)', base: 'base peak (BPC)', extracted: 'extracted traces (XIC)' }

const DRAWN_FEATURES: Record<TraceKind, string> = { total: 'the sum of the features as peaks', base: 'the highest of the features as peaks', extracted: 'each feature as a peak' }

/** "Mirrored chromatogram: base peak (BPC), drawn from features". */
export function chromatogramTitle(kind: TraceKind, origin: TraceOrigin): string {
  return `Mirrored chromatogram: ${KIND_NAMES[kind]}${origin === 'features' ? ', drawn from features' : ''}`
}

/** The highest point of a line within the window. */
export interface HighestPoint {
  side: 'A' | 'B'
  /** Null: the mean of the side. */
  sampleName: string | null
  feature: number | null
  /** NaN where nothing stands there. */
  minutes: number
  value: number
}

/** For each line its highest point within the window: means first, then samples. */
export function highestPoints(curves: readonly Curve[], [from, to]: TimeWindow): HighestPoint[] {
  const points = curves.map(({ side, sampleName, feature, minutes, values }): HighestPoint => {
    let top = -1
    for (let i = firstNotBelow(minutes, from); i < minutes.length && minutes[i]! <= to; i++) {
      if (values[i]! > (top < 0 ? 0 : values[top]!)) top = i
    }
    return { side, sampleName, feature, minutes: top < 0 ? Number.NaN : minutes[top]!, value: top < 0 ? 0 : values[top]! }
  })
  return [...points.filter(({ sampleName }) => sampleName === null), ...points.filter(({ sampleName }) => sampleName !== null)]
}

/** A value of the drawing with its unit. */
export function formatTraceValue(value: number, scale: TraceScale): string {
  return scale === 'own' ? `${Math.round(value)} %` : formatIntensity(value)
}

export interface ChromatogramTextInput {
  curves: readonly Curve[]
  window: TimeWindow
  kind: TraceKind
  origin: TraceOrigin
  /** There is raw data, whether it is drawn or not. */
  hasTraces: boolean
  scale: TraceScale
  byAmount: boolean
  names: SideNames
  /** Compared samples that have no trace, where others have. */
  withoutTrace: readonly string[]
  /** Names of features by their place, as "m/z 353.0878". */
  featureName: (feature: number) => string
}

/** The mirrored chromatogram in words, for who does not see it. */
export function chromatogramText({ curves, window, kind, origin, hasTraces, scale, byAmount, names, withoutTrace, featureName }: ChromatogramTextInput): string {
  const samplesOf = (side: 'A' | 'B') => new Set(curves.flatMap(curve => curve.side === side ? curve.sampleName ?? [] : [])).size
  const means = highestPoints(curves, window).filter(({ sampleName }) => sampleName === null)
  const tops = means.map(({ side, feature, minutes, value }) => {
    const who = `${feature === null ? 'the mean of' : `${featureName(feature)} in`} ${side === 'A' ? names.a : names.b}`
    return Number.isNaN(minutes) ? `nothing of ${who}` : `${who} at ${formatMinutes(minutes)} min (${formatTraceValue(value, scale)})`
  })
  return [
    origin === 'features' ? `${hasTraces ? 'Not the raw data' : 'No raw data'}: ${DRAWN_FEATURES[kind]} 0.1 min wide at half height, as high as ${kind === 'extracted' ? 'its' : 'their'} intensity.` : '',
    `Up ${names.a} (${counted(samplesOf('A'), 'sample')}), down ${names.b} (${counted(samplesOf('B'), 'sample')}): each sample a thin line, the mean of the side a strong one.`,
    scale === 'normalised' ? (byAmount ? 'Normalised as the comparison.' : 'In counts, as the comparison.') : 'Each line to its own highest point, so that even noise can look like a peak.',
    withoutTrace.length > 0 ? `Without a trace: ${withoutTrace.join(', ')}.` : '',
    tops.length > 0 ? `Highest from ${formatMinutes(window[0])} to ${formatMinutes(window[1])} min: ${tops.slice(0, 4).join('; ')}${tops.length > 4 ? '; more in the table' : ''}.` : '',
  ].filter(Boolean).join(' ')
}
