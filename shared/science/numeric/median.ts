import { select } from './select'

/**
 * Median of a list of numbers; the mean of the middle two where their number is even.
 *
 * @param values not changed
 * @returns NaN for an empty list
 */
export function median(values: ArrayLike<number>): number {
  return medianInPlace(values instanceof Float64Array ? values.slice() : Float64Array.from(values))
}

/** The same, leaving the values in another order: for a copy that is not needed any more. */
export function medianInPlace(values: Float64Array): number {
  const count = values.length
  if (count === 0) return Number.NaN
  const middle = count >> 1
  const upper = select(values, middle)
  if (count % 2 === 1) return upper
  let lower = Number.NEGATIVE_INFINITY
  for (let i = 0; i < middle; i++) lower = Math.max(lower, values[i]!)
  return (lower + upper) / 2
}
