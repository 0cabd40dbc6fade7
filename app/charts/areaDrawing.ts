import { areaPaneOf } from '~/charts/areaNumbers'
import { PANES, toPixelX, toPixelY, toValueX, toValueY, type FoldFrame, type PaneName, type PlotPane } from '~/charts/foldFrame'
import type { FoldPlotKind } from '~/charts/foldPoints'
import { simplifyOutline } from '~/charts/outline'
import { MOST_CORNERS, roundedArea, type Corner, type PlotArea } from '~/utils/plotArea'

/** An outline drawn on a pane, in pixels, as an area: simplified as it looks there, then in the numbers of the axes. */
export function areaFromDrawing(pane: PlotPane, name: PaneName, kind: FoldPlotKind, outline: readonly Corner[]): PlotArea {
  const corners = simplifyOutline(outline, MOST_CORNERS).map(([x, y]): Corner => [toValueX(pane, x), toValueY(pane, y)])
  return roundedArea({ pane: areaPaneOf(name, kind), corners })
}

/** Where an area lies on the drawing; null where the plot counts upwards by something else. */
export function areaOnDrawing({ panes }: FoldFrame, kind: FoldPlotKind, { pane, corners }: PlotArea): { pane: PaneName, corners: Corner[] } | null {
  const name = PANES.find(each => areaPaneOf(each, kind) === pane)
  return name ? { pane: name, corners: corners.map(([x, y]): Corner => [toPixelX(panes[name], x), toPixelY(panes[name], y)]) } : null
}
