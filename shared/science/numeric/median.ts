import { quantileSorted } from './quantile'

/**
 * Median of a list of numbers; the mean of the middle two where their number is even.
 *
 * @returns NaN for an empty list
 */
export function median(values: ArrayLike<number>): number {
  return quantileSorted(Float64Array.from(values).sort(), 0.5)
}
