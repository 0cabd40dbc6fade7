import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { toPixelX, toPixelY, type FoldFrame } from '~/charts/foldFrame'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { METHOD } from '#shared/science/verdict/reasons'
import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { formatLog2 } from '~/utils/formatStatistics'

/** The 95 % interval of a ratio as a bar across its mark, in pixels; an end beyond the plot is cut at its edge. */
export interface Whisker { from: number, to: number, y: number, cutLeft: boolean, cutRight: boolean }

/** Null where the feature has no interval, or its height or the whole interval lies beyond the plot. */
export function whiskerOf({ panes: { ratios } }: FoldFrame, points: FoldPoints, { low, high }: Pick<VerdictColumns, 'low' | 'high'>, feature: number): Whisker | null {
  const [from = Number.NaN, to = Number.NaN, y = Number.NaN] = [low[feature], high[feature], points.y[feature]]
  const [left, right] = ratios.x
  if (points.place[feature] !== PLACE.ratios || !(from <= right && to >= left && y >= ratios.y[0] && y <= ratios.y[1])) return null
  return { from: toPixelX(ratios, Math.max(from, left)), to: toPixelX(ratios, Math.min(to, right)), y: toPixelY(ratios, y), cutLeft: from < left, cutRight: to > right }
}

/** The bar as a path: caps at its ends, an arrow where it goes on beyond the edge. */
export function whiskerPath({ from, to, y, cutLeft, cutRight }: Whisker): string {
  const end = (x: number, isCut: boolean, inwards: number) => isCut ? `M${x + 6 * inwards} ${y - 4}L${x} ${y}L${x + 6 * inwards} ${y + 4}` : `M${x} ${y - 5}V${y + 5}`
  return `M${from} ${y}H${to}${end(from, cutLeft, 1)}${end(to, cutRight, -1)}`
}

/** The same in words, for the selected feature; empty where there is no interval. */
export function whiskerText({ low, high, method }: Pick<VerdictColumns, 'low' | 'high' | 'method'>, feature: number, names: SideNames): string {
  const [from = Number.NaN, to = Number.NaN] = [low[feature], high[feature]]
  if (!Number.isFinite(from) || !Number.isFinite(to)) return ''
  const assumed = method[feature] === METHOD.assumed ? ', by assumed precision' : ''
  return `The bar is the 95 % interval of the selected feature: log2 ${formatLog2(from)} to ${formatLog2(to)}, ${names.b} over ${names.a}${assumed}.`
}
