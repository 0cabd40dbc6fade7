import type { Preparation } from './preparations'
import { preparationLog2, sideStatistics } from './sideStatistics'

/** What the traces of one side show at each feature's m/z and time, normalised as its samples are. */
export interface SideTraces {
  /** Samples compared on this side, and the positions of those without a trace that was looked into. */
  samples: number
  without: number[]
  /** Median over preparations of the highest signal, over those where a signal stands; NaN: none does. */
  level: Float64Array
  /** Highest signal in any sample; 0 where nothing stands there, NaN where no trace covers the feature. */
  highest: Float64Array
  /** How many samples' traces cover the feature. */
  covering: Uint16Array
}

/**
 * Gathers the traces of a side. Injections of one preparation are averaged in log2, as intensities are.
 *
 * @param preparations those of the side, in their canonical order
 * @param factor per sample, to normalised counts
 * @param maxima per sample, highest signal a feature in counts; null where a sample has no trace
 */
export function sideTraces(preparations: readonly Preparation[], factor: Float64Array, maxima: readonly (Float64Array | null)[], features: number): SideTraces {
  const positions = preparations.flatMap(({ injections }) => injections)
  const withTrace = preparations.map(({ injections }) => injections.flatMap((index) => {
    const values = maxima[index]
    return values ? [{ intensity: values, factor: factor[index] ?? Number.NaN }] : []
  })).filter(traced => traced.length > 0)
  const highest = new Float64Array(features).fill(Number.NaN)
  const covering = new Uint16Array(features)
  for (const { intensity, factor: scale } of withTrace.flat()) {
    for (let i = 0; i < features; i++) {
      const value = intensity[i]! * scale
      if (value !== value) continue
      covering[i]!++
      if (!(highest[i]! >= value)) highest[i] = value
    }
  }
  const seen = new Uint16Array(features)
  const level = sideStatistics(withTrace.map(traced => preparationLog2(traced, seen)), seen).median
  return { samples: positions.length, without: positions.filter(index => !maxima[index]), level, highest, covering }
}
