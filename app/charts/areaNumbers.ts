import type { FoldFrame, PaneName } from '~/charts/foldFrame'
import type { FoldPlotKind } from '~/charts/foldPoints'
import { areaBounds, rectangleArea, type AreaPane, type PlotArea } from '~/utils/plotArea'

/** A rectangle of the fold-change plot as people type it; in a lane y is the reach itself, not its logarithm. */
export interface AreaFields { xFrom: number | null, xTo: number | null, yFrom: number | null, yTo: number | null }

/** What an area says it is drawn on, for a pane of a plot that counts upwards by `kind`. */
export const areaPaneOf = (pane: PaneName, kind: FoldPlotKind): AreaPane => pane === 'ratios' ? kind : pane
const short = (value: number) => Number(value.toPrecision(4)) + 0

/** The fields to begin with: around the area drawn, where it stands on that pane; else all that the pane shows. */
export function areaNumbers({ panes }: FoldFrame, area: PlotArea | null, kind: FoldPlotKind, asked?: PaneName): { pane: PaneName, fields: AreaFields } {
  const drawnOn = (['ratios', 'laneA', 'laneB'] as const).find(name => area?.pane === areaPaneOf(name, kind))
  const pane = asked ?? drawnOn ?? 'ratios'
  const { x, y } = area && pane === drawnOn ? areaBounds(area) : panes[pane]
  const height = (value: number) => pane === 'ratios' ? short(value) : short(10 ** value)
  return { pane, fields: { xFrom: Number(x[0].toFixed(4)), xTo: Number(x[1].toFixed(4)), yFrom: height(y[0]), yTo: height(y[1]) } }
}

/** The rectangle of the fields; null where a number is missing, or a reach is not above 0. */
export function areaOfNumbers(pane: PaneName, kind: FoldPlotKind, { xFrom, xTo, yFrom, yTo }: AreaFields): PlotArea | null {
  if (xFrom === null || xTo === null || yFrom === null || yTo === null) return null
  if (pane === 'ratios') return rectangleArea(kind, [xFrom, xTo], [yFrom, yTo])
  return yFrom > 0 && yTo > 0 ? rectangleArea(pane, [xFrom, xTo], [Math.log10(yFrom), Math.log10(yTo)]) : null
}
