import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { windowOf, type PlotWindow } from '~/utils/plotWindow'

/** A window of the plot of ratios around a feature: a quarter of the whole in each direction; null where it is not on that plot. */
export function zoomOn(points: FoldPoints, feature: number): PlotWindow | null {
  if (points.place[feature] !== PLACE.ratios) return null
  const halfWidth = Math.max(0.5, points.widest / 4)
  const halfHeight = Math.max(0.5, (points.highest - points.lowest) / 8)
  const x = points.x[feature] ?? 0
  const y = points.y[feature] ?? 0
  return { x: [x - halfWidth, x + halfWidth], y: [y - halfHeight, y + halfHeight] }
}

/** A window so many times as wide and high about its middle; null where that holds the whole plot, and as it was where it would be too small. */
export function scaledWindow(shown: PlotWindow, by: number, whole: PlotWindow): PlotWindow | null {
  const scaled = ([low, high]: [number, number]): [number, number] => {
    const middle = (low + high) / 2
    const half = (high - low) / 2 * by
    return [middle - half, middle + half]
  }
  const [x, y] = [scaled(shown.x), scaled(shown.y)]
  const holds = (inner: [number, number], outer: [number, number]) => outer[0] <= inner[0] && outer[1] >= inner[1]
  if (holds(whole.x, x) && holds(whole.y, y)) return null
  return windowOf(x, y) ?? shown
}
