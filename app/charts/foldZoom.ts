import { PLACE, type FoldPoints } from '~/charts/foldPoints'

/** A window of the plot of ratios around a feature: a quarter of the whole in each direction; null where it is not on that plot. */
export function zoomOn(points: FoldPoints, feature: number): { x: [number, number], y: [number, number] } | null {
  if (points.place[feature] !== PLACE.ratios) return null
  const halfWidth = Math.max(0.5, points.widest / 4)
  const halfHeight = Math.max(0.5, (points.highest - points.lowest) / 8)
  const x = points.x[feature] ?? 0
  const y = points.y[feature] ?? 0
  return { x: [x - halfWidth, x + halfWidth], y: [y - halfHeight, y + halfHeight] }
}
