import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { insideOutline } from '~/charts/outline'
import type { AreaPane, PlotArea } from '~/utils/plotArea'

/** The place whose features an area on this pane can hold; none where the plot of ratios counts upwards by something else. */
function placeOf(pane: AreaPane, { kind }: Pick<FoldPoints, 'kind'>): number {
  if (pane === 'laneA') return PLACE.laneA
  if (pane === 'laneB') return PLACE.laneB
  return pane === kind ? PLACE.ratios : PLACE.none
}

/** An area as a question to one feature: does its mark lie inside? Features that are not drawn lie in no area. */
export function areaRule(points: FoldPoints, { pane, corners }: PlotArea): (feature: number) => boolean {
  const place = placeOf(pane, points)
  const isInside = insideOutline(corners)
  return i => place !== PLACE.none && points.place[i] === place && isInside(points.x[i]!, points.y[i]!)
}
