import type { Moments } from './meanAndVariance'
import { studentTwoSided } from './studentTail'

/** Variances below this count as zero: no spread between replicates. */
export const NO_SPREAD_VARIANCE = 1e-12

/** Difference of means (B − A), its standard error and degrees of freedom, t and two-sided p. */
export interface WelchResult {
  difference: number
  standardError: number
  degreesOfFreedom: number
  t: number
  p: number
}

/**
 * Welch's t-test of two means with unequal variances (Welch 1947, Biometrika 34:28).
 * Needs two values or more a side; without spread on either side, or with fewer values, standard error, df, t and p are NaN.
 */
export function welch(a: Moments, b: Moments): WelchResult {
  const difference = b.mean - a.mean
  const none = { difference, standardError: Number.NaN, degreesOfFreedom: Number.NaN, t: Number.NaN, p: Number.NaN }
  if (a.n < 2 || b.n < 2) return none
  const shareA = spread(a.variance) / a.n
  const shareB = spread(b.variance) / b.n
  const sum = shareA + shareB
  if (!(sum > 0)) return none
  const degreesOfFreedom = sum * sum / (shareA * shareA / (a.n - 1) + shareB * shareB / (b.n - 1))
  const standardError = Math.sqrt(sum)
  const t = difference / standardError
  return { difference, standardError, degreesOfFreedom, t, p: studentTwoSided(t, degreesOfFreedom) }
}

function spread(variance: number): number {
  return variance < NO_SPREAD_VARIANCE ? 0 : variance
}
