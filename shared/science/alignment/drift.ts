import { interpolate } from '../numeric/interpolate'
import { lowess } from '../numeric/lowess'

/** Fewer landmarks than this make no drift curve. */
export const fewestLandmarks = 20
/** At least this share of the landmarks must lie within the retention tolerance of the curve. */
export const leastShareNear = 0.5
const curveSettings = { span: 0.3, iterations: 3, maxKnots: 200 }

/** A table's retention drift: minutes to subtract at minutes of the table. No knots: nothing to subtract. */
export interface DriftCurve {
  knotMinutes: Float64Array
  knotShiftMinutes: Float64Array
}

export interface DriftFit {
  /** null where the points do not carry a curve. */
  curve: DriftCurve | null
  points: number
  /** Share of the points within the retention tolerance of the curve; NaN where there were too few to fit. */
  shareNear: number
}

export const noDrift: DriftCurve = { knotMinutes: new Float64Array(0), knotShiftMinutes: new Float64Array(0) }

/**
 * Fits a table's drift: robust LOWESS (span 0.3, 3 robustness iterations) of the shift at its distinct times, or at 200 quantiles of them.
 *
 * @param minutes ascending
 * @param shiftMinutes as many shifts to the common time
 */
export function fitDrift(minutes: Float64Array, shiftMinutes: Float64Array, retentionMinutes: number): DriftFit {
  const points = minutes.length
  if (points < fewestLandmarks) return { curve: null, points, shareNear: Number.NaN }
  const { knotX, knotY, fit } = lowess(minutes, shiftMinutes, curveSettings)
  let near = 0
  for (let i = 0; i < points; i++) if (Math.abs(shiftMinutes[i]! - fit[i]!) <= retentionMinutes) near++
  const shareNear = near / points
  return { curve: shareNear >= leastShareNear ? { knotMinutes: knotX, knotShiftMinutes: knotY } : null, points, shareNear }
}

/** Minutes after the drift is taken out, never below 0. */
export function correctMinutes(curve: DriftCurve, minutes: number): number {
  return Math.max(0, minutes - interpolate(curve.knotMinutes, curve.knotShiftMinutes, minutes))
}

/** One curve that does what two do together: `second` was fitted, over the table's own minutes, to what `first` left. */
export function addDrift(first: DriftCurve, second: DriftCurve): DriftCurve {
  return {
    knotMinutes: second.knotMinutes,
    knotShiftMinutes: second.knotShiftMinutes.map((shift, k) => shift + interpolate(first.knotMinutes, first.knotShiftMinutes, second.knotMinutes[k]!)),
  }
}
