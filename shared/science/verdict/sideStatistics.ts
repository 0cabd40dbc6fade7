/** What one side says of each feature, over the preparations that detect it (normalised; log2 where named). */
export interface SideStatistics {
  /** Preparations that detect the feature. */
  detected: Uint16Array
  /** Injections that detect the feature. */
  injections: Uint16Array
  mean: Float64Array
  variance: Float64Array
  /** Median, lowest and highest normalised intensity over detecting preparations. */
  median: Float64Array
  lowest: Float64Array
  highest: Float64Array
}

/**
 * Log2 of the normalised intensities of one preparation: the mean of the log2 values of the injections that detect the feature.
 * NaN where none does. `injections` is counted up in place where given.
 */
export function preparationLog2(injected: readonly { intensity: Float64Array, factor: number }[], injections: Uint16Array): Float64Array {
  const features = injections.length
  const sum = new Float64Array(features)
  const count = new Uint16Array(features)
  for (const { intensity, factor } of injected) {
    const shift = Math.log2(factor)
    for (let i = 0; i < features; i++) {
      const value = intensity[i]!
      if (value > 0) {
        sum[i]! += Math.log2(value) + shift
        count[i]!++
        injections[i]!++
      }
    }
  }
  for (let i = 0; i < features; i++) sum[i] = count[i]! > 0 ? sum[i]! / count[i]! : Number.NaN
  return sum
}

/** Statistics of each feature over the preparations of a side; `log2` holds one column a preparation. */
export function sideStatistics(log2: readonly Float64Array[], injections: Uint16Array): SideStatistics {
  const features = injections.length
  const result: SideStatistics = {
    detected: new Uint16Array(features),
    injections,
    mean: new Float64Array(features).fill(Number.NaN),
    variance: new Float64Array(features).fill(Number.NaN),
    median: new Float64Array(features).fill(Number.NaN),
    lowest: new Float64Array(features).fill(Number.NaN),
    highest: new Float64Array(features).fill(Number.NaN),
  }
  const values = new Float64Array(log2.length)
  for (let i = 0; i < features; i++) {
    let n = 0
    let sum = 0
    for (let p = 0; p < log2.length; p++) {
      const value = log2[p]![i]!
      if (value !== value) continue
      sum += value
      let at = n++
      for (; at > 0 && values[at - 1]! > value; at--) values[at] = values[at - 1]!
      values[at] = value
    }
    result.detected[i] = n
    if (n === 0) continue
    const mean = sum / n
    result.mean[i] = mean
    if (n > 1) {
      let squares = 0
      for (let k = 0; k < n; k++) squares += (values[k]! - mean) ** 2
      result.variance[i] = squares / (n - 1)
    }
    const half = n >> 1
    const upper = 2 ** values[half]!
    result.median[i] = n % 2 === 1 ? upper : (2 ** values[half - 1]! + upper) / 2
    result.lowest[i] = 2 ** values[0]!
    result.highest[i] = 2 ** values[n - 1]!
  }
  return result
}
