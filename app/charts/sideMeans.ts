import type { ComparisonData } from '#shared/formats/comparisonData'
import { studentQuantile } from '#shared/science/statistics/studentQuantile'
import { chooseSamples } from '#shared/science/verdict/chooseSamples'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import { summariseSides } from '#shared/science/verdict/summariseSides'
import type { Signal } from '~/utils/benchView'

export interface PreparationMean { label: string, log2: number }

export interface SideMean {
  side: 'A' | 'B'
  preparations: PreparationMean[]
  /** Preparations that show the feature; the mean is over these. */
  detected: number
  /** Mean of log2 over preparations; NaN where none shows it. */
  log2: number
  /** 95 % interval of that mean, log2; null below two preparations that show it. */
  interval: [low: number, high: number] | null
}

/** Means of one feature by preparation and side, by the comparison's own functions. */
export function sideMeans(data: ComparisonData, settings: Pick<ComparisonSettings, 'normaliseByAmount'>, feature: number, signal: Signal): SideMean[] {
  const { compared } = chooseSamples(data.samples, settings.normaliseByAmount)
  const summary = summariseSides({
    samples: compared.flatMap(s => data.samples[s] ?? []),
    intensity: compared.map(s => Float64Array.of(data.intensity[s]?.[feature] ?? Number.NaN)),
    mz: Float64Array.of(data.mz[feature] ?? Number.NaN),
    retentionMinutes: Float64Array.of(data.retentionMinutes[feature] ?? Number.NaN),
    neighbourStart: new Int32Array(2),
    neighbourList: new Int32Array(0),
    normaliseByAmount: settings.normaliseByAmount && signal === 'normalised',
  })
  return (['A', 'B'] as const).map((side) => {
    const { detected, mean, variance } = side === 'A' ? summary.a : summary.b
    const n = detected[0] ?? 0
    const log2 = mean[0] ?? Number.NaN
    const half = n > 1 ? studentQuantile(0.95, n - 1) * Math.sqrt((variance[0] ?? Number.NaN) / n) : Number.NaN
    return {
      side,
      preparations: summary.preparations.flatMap((preparation, p) => preparation.side === side ? [{ label: preparation.label, log2: summary.log2[p]?.[0] ?? Number.NaN }] : []),
      detected: n,
      log2,
      interval: Number.isFinite(half) ? [log2 - half, log2 + half] : null,
    }
  })
}
