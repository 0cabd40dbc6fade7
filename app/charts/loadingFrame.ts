import type { LoadingPoints } from '~/charts/componentLoadings'
import { toPixelX, toPixelY, type PlotPane } from '~/charts/foldFrame'
import { pointGrid, type PointGrid } from '~/charts/pointGrid'
import type { PlotWindow } from '~/utils/plotWindow'

/** Where the plot of loadings lies on its drawing, in CSS pixels, and what its axes reach from and to. */
export interface LoadingFrame {
  width: number
  height: number
  pane: PlotPane
  /** Between the marks of the axes; null where a window is shown. */
  interval: { x: number, y: number } | null
}

/** CSS pixels, of the page. */
const HEIGHT = 360
const ROOM = { left: 56, right: 16, top: 16, bottom: 44 }
/** Marks of an axis, about. */
const STEPS = { wide: 5, narrow: 3 }

/** Lays the plot out for a drawing so wide; `shown` is the part that is seen, null all of it. */
export function loadingFrame({ x, y }: Pick<LoadingPoints, 'x' | 'y'>, width: number, shown: PlotWindow | null, height = HEIGHT): LoadingFrame {
  const across = evenRange(x, width < 400 ? STEPS.narrow : STEPS.wide)
  const upwards = evenRange(y, STEPS.wide)
  return {
    width,
    height,
    pane: {
      left: ROOM.left, top: ROOM.top, width: Math.max(80, width - ROOM.left - ROOM.right), height: height - ROOM.top - ROOM.bottom,
      x: shown?.x ?? across.ends, y: shown?.y ?? upwards.ends,
    },
    interval: shown ? null : { x: across.interval, y: upwards.interval },
  }
}

/** A range that holds zero and all values, with a little room, whose ends are marks of the axis. */
function evenRange(values: Float64Array, steps: number): { ends: [number, number], interval: number } {
  let low = 0
  let high = 0
  for (const value of values) {
    if (value < low) low = value
    if (value > high) high = value
  }
  const least = (high - low || 1) / steps
  const power = 10 ** Math.floor(Math.log10(least))
  const interval = ([1, 2, 5, 10].find(each => each * power >= least * (1 - 1e-9)) ?? 10) * power
  const room = (high - low || 1) * 0.02
  const end = (value: number) => Number((value * interval).toPrecision(12))
  return { ends: [end(Math.floor((low - room) / interval)), end(Math.ceil((high + room) / interval))], interval }
}

/** Where a feature's mark lies on the drawing; null where it is not drawn, or beyond the window. */
export function loadingMark({ pane }: LoadingFrame, { features, x, y }: LoadingPoints, feature: number): { x: number, y: number } | null {
  const k = features.indexOf(feature)
  return k >= 0 && isShown(pane, x[k]!, y[k]!) ? { x: toPixelX(pane, x[k]!), y: toPixelY(pane, y[k]!) } : null
}

/** All drawn marks, ready to be found by their place on the drawing. */
export function loadingMarks({ pane }: LoadingFrame, { features, x, y }: LoadingPoints): PointGrid {
  const across = Float32Array.from(x, (value, k) => isShown(pane, value, y[k]!) ? toPixelX(pane, value) : Number.NaN)
  return pointGrid(across, Float32Array.from(y, value => toPixelY(pane, value)), features)
}

const isShown = ({ x, y }: PlotPane, valueX: number, valueY: number) => valueX >= x[0] && valueX <= x[1] && valueY >= y[0] && valueY <= y[1]

/** The surroundings of a feature: an eighth of the plot to each side; null where it is not on it. */
export function aroundLoading({ features, x, y }: LoadingPoints, feature: number): PlotWindow | null {
  const k = features.indexOf(feature)
  if (k < 0) return null
  const ends = (values: Float64Array): [number, number] => {
    const half = (values.reduce((high, value) => Math.max(high, value)) - values.reduce((low, value) => Math.min(low, value))) / 8 || 0.01
    return [values[k]! - half, values[k]! + half]
  }
  return { x: ends(x), y: ends(y) }
}
