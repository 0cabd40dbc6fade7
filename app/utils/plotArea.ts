/** On what an area of the fold-change plot is drawn: the plot of ratios, by what it counts upwards, or a lane. */
export const AREA_PANES = ['certainty', 'abundance', 'laneA', 'laneB'] as const
export type AreaPane = (typeof AREA_PANES)[number]

/** A corner in the numbers of the axes: log2 ratio and height of the plot, or m/z and log10 of the reach in a lane. */
export type Corner = readonly [x: number, y: number]

/** An area drawn on the fold-change plot; closed, so that its first corner is not said again. */
export interface PlotArea { pane: AreaPane, corners: Corner[] }

/** A lasso is simplified to so many corners, so that an address can hold it. */
export const MOST_CORNERS = 32
const DECIMALS = 4
const LARGEST = 1e5

/** An area with its corners as the address holds them: rounded, and −0 as 0. */
export function roundedArea({ pane, corners }: PlotArea): PlotArea {
  const round = (value: number) => Number(value.toFixed(DECIMALS)) + 0
  return { pane, corners: corners.map(([x, y]) => [round(x), round(y)]) }
}

/** The rectangle between two ends of each axis, in whatever order they are given. */
export function rectangleArea(pane: AreaPane, x: Corner, y: Corner): PlotArea {
  const [left, right] = [Math.min(...x), Math.max(...x)]
  const [low, high] = [Math.min(...y), Math.max(...y)]
  return roundedArea({ pane, corners: [[left, low], [right, low], [right, high], [left, high]] })
}

/** From and to of both axes: the least rectangle around the area. */
export function areaBounds({ corners }: PlotArea): { x: [number, number], y: [number, number] } {
  const ends = (values: number[]): [number, number] => [Math.min(...values), Math.max(...values)]
  return { x: ends(corners.map(([x]) => x)), y: ends(corners.map(([, y]) => y)) }
}

/** An area as the address holds it: `laneA:102.5,1.2;…`. */
export function writeArea(area: PlotArea | null): string {
  return area ? `${area.pane}:${area.corners.map(corner => corner.join(',')).join(';')}` : ''
}

/** Reads an area from an address, whatever a person made of it; undefined: no area. */
export function readArea(text: string): PlotArea | undefined {
  const [name, list = ''] = text.split(':')
  const pane = AREA_PANES.find(each => each === name)
  const corners = list.split(';').map(corner => corner.split(',').map(part => part.trim() === '' ? Number.NaN : Number(part)))
  const isCorner = (corner: number[]) => corner.length === 2 && corner.every(value => Math.abs(value) <= LARGEST)
  if (!pane || corners.length < 3 || corners.length > MOST_CORNERS || !corners.every(isCorner)) return undefined
  return roundedArea({ pane, corners: corners.map(([x = 0, y = 0]) => [x, y]) })
}
