/**
 * Quantile of numbers already in ascending order, linear between neighbours (type 7 of Hyndman & Fan 1996).
 *
 * @param sorted ascending values
 * @param share 0 to 1
 * @returns NaN for an empty list
 */
export function quantileSorted(sorted: ArrayLike<number>, share: number): number {
  const last = sorted.length - 1
  if (last < 0) return Number.NaN
  const position = Math.min(Math.max(share, 0), 1) * last
  const below = Math.floor(position)
  const low = sorted[below]!
  const high = sorted[Math.min(below + 1, last)]!
  return low + (high - low) * (position - below)
}

/** Quantile of numbers in any order (type 7 of Hyndman & Fan 1996); NaN for an empty list. */
export function quantile(values: ArrayLike<number>, share: number): number {
  return quantileSorted(Float64Array.from(values).sort(), share)
}
