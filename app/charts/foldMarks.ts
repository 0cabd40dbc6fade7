import { paneOfPlace, toPixelX, toPixelY, type FoldFrame } from '~/charts/foldFrame'
import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { pointGrid, type PointGrid } from '~/charts/pointGrid'

/** The drawn marks of these features, ready to be found by their place on the drawing; what lies beyond the window is not there. */
export function foldMarks({ panes }: FoldFrame, points: FoldPoints, rows: Int32Array): PointGrid {
  const x = new Float32Array(rows.length)
  const y = new Float32Array(rows.length)
  const paneOf = [PLACE.none, PLACE.laneA, PLACE.ratios, PLACE.laneB].map(place => paneOfPlace[place]).map(name => name && panes[name])
  for (let at = 0; at < rows.length; at++) {
    const i = rows[at]!
    const pane = paneOf[points.place[i]!]
    const valueX = points.x[i]!
    const valueY = points.y[i]!
    const isShown = pane && valueX >= pane.x[0] && valueX <= pane.x[1] && valueY >= pane.y[0] && valueY <= pane.y[1]
    x[at] = isShown ? toPixelX(pane, valueX) : Number.NaN
    y[at] = isShown ? toPixelY(pane, valueY) : Number.NaN
  }
  return pointGrid(x, y, rows)
}
