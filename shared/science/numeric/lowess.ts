import { interpolate } from './interpolate'
import { medianInPlace } from './median'

export interface LowessCurve {
  /** Ascending distinct x at which the curve was fitted. */
  knotX: Float64Array
  /** Fitted value at each knot. */
  knotY: Float64Array
  /** Fitted value at each given x, on straight lines between knots. */
  fit: Float64Array
}

export interface LowessOptions {
  /** Share of the points that each local line rests on (Cleveland's f). */
  span: number
  /** Rounds of reweighting by residuals; 0 for none. */
  iterations: number
  /** Most knots; with more distinct x than this the curve is fitted at as many quantiles of them. */
  maxKnots?: number
}

/**
 * Robust locally weighted regression (Cleveland 1979, JASA 74:829): local lines with tricube weights, then bisquare
 * weights from the residuals. With a knot at every distinct x it equals the published algorithm without its delta.
 *
 * @param x ascending; at least one value
 * @param y as many values
 */
export function lowess(x: Float64Array, y: Float64Array, options: LowessOptions): LowessCurve {
  const count = x.length
  const knots = pickKnots(x, options.maxKnots ?? Number.POSITIVE_INFINITY)
  const window = Math.max(Math.min(count, 2), Math.min(count, Math.floor(options.span * count + 1e-7)))
  const robustness = new Float64Array(count).fill(1)
  let curve = fitKnots(x, y, knots, window, robustness)
  for (let round = 0; round < options.iterations; round++) {
    if (!reweigh(y, curve.fit, robustness)) break
    curve = fitKnots(x, y, knots, window, robustness)
  }
  return curve
}

function pickKnots(x: Float64Array, maxKnots: number): Float64Array {
  const distinct = x.filter((value, i) => i === 0 || value !== x[i - 1])
  if (distinct.length <= maxKnots) return distinct
  const last = distinct.length - 1
  return Float64Array.from({ length: maxKnots }, (_, k) => distinct[Math.round(k * last / (maxKnots - 1))]!)
}

function fitKnots(x: Float64Array, y: Float64Array, knots: Float64Array, window: number, robustness: Float64Array): LowessCurve {
  const count = x.length
  const keptX: number[] = []
  const keptY: number[] = []
  const minimumSpread = 0.001 * (x[count - 1]! - x[0]!)
  let left = 0
  for (const at of knots) {
    while (left + window < count && at - x[left]! > x[left + window]! - at) left++
    const value = localLine(x, y, robustness, at, left, left + window - 1, minimumSpread)
    // Where robustness left no point with weight, the neighbouring knots speak.
    if (Number.isNaN(value)) continue
    keptX.push(at)
    keptY.push(value)
  }
  const knotX = Float64Array.from(keptX)
  const knotY = Float64Array.from(keptY)
  return { knotX, knotY, fit: x.map(value => interpolate(knotX, knotY, value)) }
}

/** Weighted straight line through the window, read at `at`; its sums run over distances from there. */
function localLine(
  x: Float64Array, y: Float64Array, robustness: Float64Array, at: number, left: number, right: number, minimumSpread: number,
): number {
  const reach = Math.max(at - x[left]!, x[right]! - at)
  const far = 0.999 * reach
  const near = 0.001 * reach
  let sum = 0
  let sumX = 0
  let sumXX = 0
  let sumY = 0
  let sumXY = 0
  for (let j = left; j < x.length; j++) {
    const offset = x[j]! - at
    const distance = Math.abs(offset)
    if (distance > far) {
      if (offset > 0) break
      continue
    }
    let weight = robustness[j]!
    if (distance > near) {
      const share = distance / reach
      const tricube = 1 - share * share * share
      weight *= tricube * tricube * tricube
    }
    const weightedX = weight * offset
    sum += weight
    sumX += weightedX
    sumXX += weightedX * offset
    sumY += weight * y[j]!
    sumXY += weightedX * y[j]!
  }
  if (sum <= 0) return Number.NaN
  const centre = sumX / sum
  const mean = sumY / sum
  const variance = sumXX / sum - centre * centre
  return variance > minimumSpread * minimumSpread ? mean - centre * (sumXY / sum - centre * mean) / variance : mean
}

/** Bisquare weights from the residuals; false where they are too small to tell points apart. */
function reweigh(y: Float64Array, fit: Float64Array, robustness: Float64Array): boolean {
  const residuals = y.map((value, i) => Math.abs(value - fit[i]!))
  const mean = residuals.reduce((sum, value) => sum + value, 0) / residuals.length
  const limit = 6 * medianInPlace(residuals.slice())
  if (limit < 1e-7 * mean || limit === 0) return false
  for (let i = 0; i < residuals.length; i++) {
    const share = residuals[i]! / limit
    const bisquare = 1 - share * share
    robustness[i] = share <= 0.001 ? 1 : share <= 0.999 ? bisquare * bisquare : 0
  }
  return true
}
