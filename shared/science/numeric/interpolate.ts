/**
 * Value at x of a curve of straight lines through knots; the first and last values hold outside.
 *
 * @param knotX ascending, distinct
 * @param knotY as many values
 * @returns 0 where there is no knot
 */
export function interpolate(knotX: Float64Array, knotY: Float64Array, x: number): number {
  const last = knotX.length - 1
  if (last < 0) return 0
  if (x <= knotX[0]!) return knotY[0]!
  if (x >= knotX[last]!) return knotY[last]!
  let low = 0
  let high = last
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (knotX[middle]! <= x) low = middle
    else high = middle
  }
  const share = (x - knotX[low]!) / (knotX[high]! - knotX[low]!)
  return knotY[low]! + (knotY[high]! - knotY[low]!) * share
}
