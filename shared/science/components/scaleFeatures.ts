/** None: by size of variation; unit variance: every feature alike; Pareto: halfway, by the root of the standard deviation. */
export const COMPONENT_SCALINGS = ['none', 'unitVariance', 'pareto'] as const
export type ComponentScaling = (typeof COMPONENT_SCALINGS)[number]

/**
 * Centres each feature and scales it; standard deviations with n − 1. A feature without spread stands as 0.
 *
 * @param values samples × features, sample after sample, at least two samples; not changed
 * Source: van den Berg et al. (2006) BMC Genomics 7:142
 */
export function scaleFeatures(values: Float64Array, samples: number, features: number, scaling: ComponentScaling): Float64Array {
  const mean = new Float64Array(features)
  const squares = new Float64Array(features)
  for (let i = 0, at = 0; i < samples; i++) for (let j = 0; j < features; j++) mean[j]! += values[at++]! / samples
  const scaled = new Float64Array(values.length)
  for (let i = 0, at = 0; i < samples; i++) {
    for (let j = 0; j < features; j++, at++) {
      const distance = values[at]! - mean[j]!
      scaled[at] = distance
      squares[j]! += distance * distance
    }
  }
  if (scaling === 'none') return scaled
  const divisor = squares.map((sum) => {
    const deviation = Math.sqrt(sum / (samples - 1))
    return deviation === 0 ? 1 : scaling === 'unitVariance' ? deviation : Math.sqrt(deviation)
  })
  for (let i = 0, at = 0; i < samples; i++) for (let j = 0; j < features; j++) scaled[at++]! /= divisor[j]!
  return scaled
}
