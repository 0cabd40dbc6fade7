/** Count, mean and variance (n − 1) of the values that are not NaN; variance is NaN below two values, mean NaN without any. */
export interface Moments {
  n: number
  mean: number
  variance: number
}

/** Two passes over the values, in their order: accurate for values of one size. */
export function meanAndVariance(values: ArrayLike<number>): Moments {
  let n = 0
  let sum = 0
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!
    if (value === value) { n++; sum += value }
  }
  const mean = n > 0 ? sum / n : Number.NaN
  let squares = 0
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!
    if (value === value) squares += (value - mean) ** 2
  }
  return { n, mean, variance: n > 1 ? squares / (n - 1) : Number.NaN }
}
