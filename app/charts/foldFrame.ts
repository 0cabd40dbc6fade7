import { MOST_CERTAIN, PLACE, type FoldPoints } from '~/charts/foldPoints'
import type { PlotWindow } from '~/utils/plotWindow'
import type { ComparisonSettings } from '#shared/science/verdict/settings'

/** A pane of the fold-change plot: where it lies on the drawing, in CSS pixels, and what its axes reach from and to. */
export interface PlotPane {
  left: number
  top: number
  width: number
  height: number
  x: [number, number]
  y: [number, number]
  /** Between the marks of the axis of ratios. */
  interval?: number
}

export const PANES = ['ratios', 'laneA', 'laneB'] as const
export type PaneName = (typeof PANES)[number]
export interface FoldFrame { narrow: boolean, width: number, height: number, panes: Record<PaneName, PlotPane> }

/** The pane a feature of this place stands on. */
export const paneOfPlace: Readonly<Record<number, PaneName>> = { [PLACE.ratios]: 'ratios', [PLACE.laneA]: 'laneA', [PLACE.laneB]: 'laneB' }

const TOP = 34
const BOTTOM = 44
const WIDE_HEIGHT = 400
/** On a narrow page the lanes stand below the plot of ratios, side by side, so that there is room for marks. */
const NARROW = { height: 584, ratios: 290, lanes: 130, between: 36 }

export interface FoldFrameInput {
  points: FoldPoints
  settings: Pick<ComparisonSettings, 'foldLimit' | 'reachLimit'>
  narrow: boolean
  /** Of the drawing, CSS pixels. */
  width: number
  /** The part of the plot of ratios that is shown; null: all of it. */
  shown: PlotWindow | null
}

/** Lays the panes out: ratios in the middle, a lane on each side; on a narrow page both lanes below. */
export function foldFrame({ points, settings, narrow, width, shown }: FoldFrameInput): FoldFrame {
  const reach = reachRange(points, settings.reachLimit)
  const { min, max, interval } = ratioRange(Math.max(points.widest, 2 * settings.foldLimit, 1), narrow)
  const ratios = { x: shown?.x ?? [min, max] as [number, number], y: shown?.y ?? heightRange(points), ...(shown ? {} : { interval }) }
  const lane = { x: massRange(points), y: reach }
  if (narrow) {
    const edge = 48
    const half = Math.max(40, (width - 2 * edge - NARROW.between - 8) / 2)
    const lanes = { ...lane, top: TOP + NARROW.ratios + BOTTOM + 34, width: half, height: NARROW.lanes }
    return { narrow, width, height: NARROW.height, panes: {
      ratios: { ...ratios, left: edge, top: TOP, width: Math.max(80, width - edge - 8), height: NARROW.ratios },
      laneA: { ...lanes, left: edge },
      laneB: { ...lanes, left: width - 8 - half },
    } }
  }
  const laneWidth = Math.min(104, Math.max(56, width * 0.11))
  const edge = 52
  const height = WIDE_HEIGHT - TOP - BOTTOM
  const left = edge + laneWidth + 60
  return { narrow, width, height: WIDE_HEIGHT, panes: {
    ratios: { ...ratios, left, top: TOP, width: Math.max(80, width - left - edge - laneWidth - 16), height },
    laneA: { ...lane, left: edge, top: TOP, width: laneWidth, height },
    laneB: { ...lane, left: width - edge - laneWidth, top: TOP, width: laneWidth, height },
  } }
}

/** Where values of the axes lie on the drawing, and back. */
export const toPixelX = ({ left, width, x }: PlotPane, value: number) => left + (value - x[0]) / (x[1] - x[0]) * width
export const toPixelY = ({ top, height, y }: PlotPane, value: number) => top + height - (value - y[0]) / (y[1] - y[0]) * height
export const toValueX = ({ left, width, x }: PlotPane, pixel: number) => x[0] + (pixel - left) / width * (x[1] - x[0])
export const toValueY = ({ top, height, y }: PlotPane, pixel: number) => y[0] + (top + height - pixel) / height * (y[1] - y[0])

/** The pane under a place of the drawing; null beside them. */
export function paneAt({ panes }: FoldFrame, x: number, y: number): PaneName | null {
  return PANES.find((name) => {
    const { left, top, width, height } = panes[name]
    return x >= left && x <= left + width && y >= top && y <= top + height
  }) ?? null
}

/** Where a feature's mark lies on the drawing; null where it is not drawn, or beyond the window. */
export function markOf({ panes }: FoldFrame, points: FoldPoints, feature: number): { pane: PaneName, x: number, y: number } | null {
  const name = paneOfPlace[points.place[feature] ?? PLACE.none]
  if (!name) return null
  const pane = panes[name]
  const x = points.x[feature] ?? Number.NaN
  const y = points.y[feature] ?? Number.NaN
  const isShown = x >= pane.x[0] && x <= pane.x[1] && y >= pane.y[0] && y <= pane.y[1]
  return isShown ? { pane: name, x: toPixelX(pane, x), y: toPixelY(pane, y) } : null
}

/** An even range around 0 whose ends are marks of the axis. */
function ratioRange(reached: number, narrow: boolean): { min: number, max: number, interval: number } {
  const steps = narrow ? 2 : 4
  const interval = [0.5, 1, 2, 3, 4, 5].find(each => each * steps >= reached * 1.02) ?? Math.ceil(reached / steps)
  return { min: -interval * steps, max: interval * steps, interval }
}

const orZero = (value: number) => Number.isFinite(value) ? value : 0

function heightRange(points: FoldPoints): [number, number] {
  if (points.kind === 'abundance') return [Math.floor(orZero(points.lowest)), Math.ceil(orZero(points.highest)) + 0.1]
  return [points.untested > 0 ? -0.8 : 0, Math.max(2, Math.min(MOST_CERTAIN + 0.5, Math.ceil(points.highest * 1.05)))]
}

function reachRange(points: FoldPoints, reachLimit: number): [number, number] {
  const limit = Math.log10(reachLimit)
  const low = Number.isNaN(points.lowestReach) ? limit : Math.min(points.lowestReach, limit)
  const high = Number.isNaN(points.highestReach) ? limit : Math.max(points.highestReach, limit)
  return [Math.min(0, Math.floor(low)), Math.max(2, Math.ceil(high * 1.02))]
}

/** The m/z of both lanes, with a little room beside the marks. */
function massRange({ lowestMz, highestMz }: FoldPoints): [number, number] {
  if (Number.isNaN(lowestMz)) return [0, 1000]
  const room = Math.max(5, (highestMz - lowestMz) * 0.05)
  return [Math.floor(lowestMz - room), Math.ceil(highestMz + room)]
}
