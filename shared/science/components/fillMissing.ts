/** log2 values without a gap, and what was done to get there. */
export interface FilledValues {
  /** The features that are left, as given. */
  features: Int32Array
  /** samples × features, sample after sample, log2. */
  values: Float64Array
  /** Values that were filled in, and the features they belong to. */
  filledValues: number
  filledFeatures: number
  /** Of those values, how many in each sample, and in each feature that is left. */
  filledOfSample: Int32Array
  filledOfFeature: Int32Array
  /** Features left out: found in none of the samples; the same in all of them, so that they say nothing. */
  notFound: number
  withoutSpread: number
}

/** log2: below this a spread is rounding. */
const SMALLEST_SPREAD = 1e-6

/**
 * log2 of the normalised intensities of some features, missing ones filled with half the feature's minimum over these samples
 * (common practice). Features found nowhere, or without spread, are left out and counted.
 *
 * @param intensity one column a sample, NaN or 0 where not detected; not changed
 * @param factors per sample, from intensity to normalised intensity
 * @param features places of the features in the columns
 */
export function fillMissing(intensity: readonly Float64Array[], factors: ArrayLike<number>, features: Int32Array): FilledValues {
  const count = features.length
  const lowest = new Float64Array(count).fill(Number.POSITIVE_INFINITY)
  const highest = new Float64Array(count).fill(Number.NEGATIVE_INFINITY)
  const missing = new Int32Array(count)
  const rows = intensity.map((column, s) => {
    const row = new Float64Array(count)
    const factor = factors[s]!
    for (let j = 0; j < count; j++) {
      const value = Math.log2(column[features[j]!]! * factor)
      row[j] = value
      if (!Number.isFinite(value)) {
        missing[j]!++
        continue
      }
      if (value < lowest[j]!) lowest[j] = value
      if (value > highest[j]!) highest[j] = value
    }
    return row
  })
  const kept = new Int32Array(count)
  const result = { filledValues: 0, filledFeatures: 0, notFound: 0, withoutSpread: 0 }
  const filledOfSample = new Int32Array(intensity.length)
  let left = 0
  for (let j = 0; j < count; j++) {
    if (missing[j] === intensity.length) result.notFound++
    else if (missing[j] === 0 && highest[j]! - lowest[j]! < SMALLEST_SPREAD) result.withoutSpread++
    else {
      kept[left++] = j
      result.filledValues += missing[j]!
      if (missing[j]! > 0) result.filledFeatures++
    }
  }
  const values = new Float64Array(intensity.length * left)
  rows.forEach((row, s) => {
    for (let k = 0, at = s * left; k < left; k++, at++) {
      const value = row[kept[k]!]!
      const isMissing = !Number.isFinite(value)
      if (isMissing) filledOfSample[s]!++
      values[at] = isMissing ? lowest[kept[k]!]! - 1 : value
    }
  })
  const ofKept = (list: Int32Array) => Int32Array.from({ length: left }, (_, k) => list[kept[k]!]!)
  return { ...result, features: ofKept(features), values, filledOfSample, filledOfFeature: ofKept(missing) }
}
