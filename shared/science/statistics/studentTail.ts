import cdf from '@stdlib/stats-base-dists-t-cdf'

/**
 * Upper tail of Student's t: P(T ≥ t) with `degreesOfFreedom` (may be fractional, > 0).
 * Taken as the lower tail of −t, so that a far tail stays a small number instead of 1 − 1 = 0. NaN in, NaN out.
 */
export function studentUpperTail(t: number, degreesOfFreedom: number): number {
  return cdf(-t, degreesOfFreedom)
}

/** Two-sided p-value of Student's t: P(|T| ≥ |t|), at most 1. */
export function studentTwoSided(t: number, degreesOfFreedom: number): number {
  return Math.min(1, 2 * cdf(-Math.abs(t), degreesOfFreedom))
}
