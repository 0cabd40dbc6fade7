import fQuantile from '@stdlib/stats-base-dists-f-quantile'

/** An ellipse in the plane of two components; radii are half axes, the angle of the greater is counted from the x axis. */
export interface GroupEllipse {
  centreX: number
  centreY: number
  greaterRadius: number
  lesserRadius: number
  angleRadians: number
}

/** Fewer samples say too little of how a group scatters. */
export const FEWEST_FOR_ELLIPSE = 5

/**
 * Hotelling's T² that a sample of a group of n stays below with 95 %: 2(n − 1)/(n − 2)·F(0.95; 2, n − 2); NaN below 3.
 * Source: Hotelling (1931) Ann Math Stat 2:360
 */
export function hotellingLimit(n: number): number {
  return n < 3 ? Number.NaN : 2 * (n - 1) / (n - 2) * fQuantile(0.95, 2, n - 2)
}

/**
 * The 95 % ellipse of a group, from the covariance of its own two score columns; null where it has fewer than five samples.
 * Samples on one line give a radius of 0.
 */
export function groupEllipse(x: ArrayLike<number>, y: ArrayLike<number>): GroupEllipse | null {
  const n = x.length
  if (n < FEWEST_FOR_ELLIPSE) return null
  let centreX = 0
  let centreY = 0
  for (let i = 0; i < n; i++) {
    centreX += x[i]! / n
    centreY += y[i]! / n
  }
  let xx = 0
  let xy = 0
  let yy = 0
  for (let i = 0; i < n; i++) {
    xx += (x[i]! - centreX) ** 2 / (n - 1)
    xy += (x[i]! - centreX) * (y[i]! - centreY) / (n - 1)
    yy += (y[i]! - centreY) ** 2 / (n - 1)
  }
  const middle = (xx + yy) / 2
  const apart = Math.hypot((xx - yy) / 2, xy)
  const limit = hotellingLimit(n)
  return {
    centreX,
    centreY,
    greaterRadius: Math.sqrt(limit * (middle + apart)),
    lesserRadius: Math.sqrt(limit * Math.max(0, middle - apart)),
    angleRadians: Math.atan2(2 * xy, xx - yy) / 2,
  }
}

/** Points around an ellipse, evenly by angle; the first once more at the end, so that a line through them closes. */
export function ellipsePoints({ centreX, centreY, greaterRadius, lesserRadius, angleRadians }: GroupEllipse, count = 72): [number, number][] {
  return Array.from({ length: count + 1 }, (_, k) => {
    const turn = 2 * Math.PI * (k % count) / count
    const along = greaterRadius * Math.cos(turn)
    const across = lesserRadius * Math.sin(turn)
    return [
      centreX + along * Math.cos(angleRadians) - across * Math.sin(angleRadians),
      centreY + along * Math.sin(angleRadians) + across * Math.cos(angleRadians),
    ]
  })
}
