/** Below this many rows the minimum stands for the floor. */
const FEW_ROWS = 50
const FLOOR_QUANTILE = 0.02

/**
 * The lowest intensity a table could have reported, estimated from what it did report: the 2nd percentile of its
 * intensities (linear between ranks), their minimum under 50 rows; *common practice*. NaN (not detected) is left out.
 * An empty table gives NaN: its floor can't be known.
 */
export function estimateFloor(intensity: ArrayLike<number>): number {
  const sorted = Float64Array.from(intensity).filter(value => value > 0).sort()
  if (sorted.length === 0) return Number.NaN
  if (sorted.length < FEW_ROWS) return sorted[0]!
  const place = FLOOR_QUANTILE * (sorted.length - 1)
  const below = Math.floor(place)
  const above = Math.min(below + 1, sorted.length - 1)
  return sorted[below]! + (place - below) * (sorted[above]! - sorted[below]!)
}
