import { fillMissing, type FilledValues } from './fillMissing'
import { principalComponents, type PrincipalComponents } from './principalComponents'
import { scaleFeatures, type ComponentScaling } from './scaleFeatures'

export interface SampleComponentsInput {
  /** One column a sample that takes part, NaN where not detected. */
  intensity: readonly Float64Array[]
  /** Per sample, from intensity to normalised intensity. */
  factors: ArrayLike<number>
  /** Places of the features that take part. */
  features: Int32Array
  scaling: ComponentScaling
  /** Components that get scores and loadings. */
  most: number
}

/** Scores in the order of the samples, loadings in the order of `features`; what was filled and left out beside them. */
export type SampleComponents = PrincipalComponents & Omit<FilledValues, 'values'>

/** Share of the time that filling and scaling take, roughly. */
const PREPARED = 0.25

/**
 * Principal components of samples: log2 of normalised intensities, missing ones filled with half the feature's minimum, centred,
 * scaled. Nothing fails: where nothing varies the rank is 0.
 *
 * @param onProgress told the share that is done, 0 to 1, and what is done
 */
export function sampleComponents({ intensity, factors, features, scaling, most }: SampleComponentsInput, onProgress: (share: number, what: string) => void = () => {}): SampleComponents {
  onProgress(0, 'Filling gaps and centring')
  const { values, ...filled } = fillMissing(intensity, factors, features)
  const samples = intensity.length
  const scaled = scaleFeatures(values, samples, filled.features.length, scaling)
  const what = 'Comparing the samples'
  onProgress(PREPARED, what)
  const found = principalComponents(scaled, samples, filled.features.length, { most, onProgress: share => onProgress(PREPARED + share * (0.9 - PREPARED), what) })
  return { ...found, ...filled }
}
