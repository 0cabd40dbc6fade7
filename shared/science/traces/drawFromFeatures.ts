/** Full width at half maximum of a peak whose width is not known, minutes (METHODS: 0.1 min). */
export const DRAWN_WIDTH_MINUTES = 0.1
/** A peak is drawn so many standard deviations to each side; beyond it is below 0.04 % of its top. */
const REACH_DEVIATIONS = 4
/** Points of a grid at most: five hours at the step of a usual width. Beyond, be it by a single odd time, the step is wider. */
const MOST_GRID_POINTS = 60_000
/** Full width at half maximum of a Gaussian in standard deviations: 2·√(2·ln 2). */
export const WIDTH_IN_DEVIATIONS = 2 * Math.sqrt(2 * Math.LN2)

/** Features of one sample, one column a value. */
export interface DrawnFeatures {
  /** Time of the peak top. */
  minutes: Float64Array
  /** Height of the peak: what its table states as intensity, area or height; NaN or not above 0: not drawn. */
  heights: Float64Array
  /** Full width at half maximum, minutes; where it is not given or not above 0, 0.1 min. */
  widthMinutes?: Float64Array
}

/** Times of equal distance: `first`, `first + step` … */
export interface EvenGrid { firstMinutes: number, stepMinutes: number, count: number }

/**
 * A trace drawn from features, where there is no raw data: each is a Gaussian as high as its intensity. `sum` adds them
 * (in the place of a total), `highest` shows the highest at each time (in the place of a base peak).
 * A top lies at most half a step beside a point of the grid: with a step of a twentieth of the width it is drawn at 99.8 % or more.
 * On a grid too wide for peaks, one that no point meets stands as high as it is at the nearest.
 *
 * @param chosen places of the features to draw; all where left out
 * @returns one value a point of the grid; 0 where no feature is near
 * @throws RangeError where columns differ in length or the step is not above 0
 */
export function drawFromFeatures({ minutes, heights, widthMinutes }: DrawnFeatures, grid: EvenGrid, combine: 'sum' | 'highest', chosen?: Int32Array): Float64Array {
  if (minutes.length !== heights.length || (widthMinutes && widthMinutes.length !== minutes.length)) throw new RangeError('Each feature has one time, one height and, where given, one width.')
  if (!(grid.stepMinutes > 0)) throw new RangeError('The step of a grid lies above 0.')
  const values = new Float64Array(grid.count)
  const features = chosen?.length ?? minutes.length
  for (let k = 0; k < features; k++) {
    const i = chosen ? chosen[k]! : k
    const height = heights[i]!
    if (!(height > 0) || !Number.isFinite(height) || !Number.isFinite(minutes[i]!)) continue
    const stated = widthMinutes?.[i] ?? 0
    addPeak(values, grid, minutes[i]!, height, (stated > 0 ? stated : DRAWN_WIDTH_MINUTES) / WIDTH_IN_DEVIATIONS, combine === 'sum')
  }
  return values
}

/** From point to point a Gaussian changes by a factor that itself changes by a constant one, so two exponentials a peak are enough. */
function addPeak(values: Float64Array, { firstMinutes, stepMinutes, count }: EvenGrid, top: number, height: number, deviation: number, sum: boolean): void {
  const from = Math.max(0, Math.ceil((top - REACH_DEVIATIONS * deviation - firstMinutes) / stepMinutes))
  const to = Math.min(count - 1, Math.floor((top + REACH_DEVIATIONS * deviation - firstMinutes) / stepMinutes))
  if (from > to) return addTop(values, Math.round((top - firstMinutes) / stepMinutes), height, sum)
  const step = stepMinutes / deviation
  const distance = (firstMinutes + from * stepMinutes - top) / deviation
  let value = height * Math.exp(-0.5 * distance * distance)
  let factor = Math.exp(-step * distance - 0.5 * step * step)
  const change = Math.exp(-step * step)
  for (let g = from; g <= to; g++) {
    if (sum) values[g]! += value
    else if (value > values[g]!) values[g] = value
    value *= factor
    factor *= change
  }
}

/** A peak narrower than a step of the grid stands at the nearest point. */
function addTop(values: Float64Array, place: number, height: number, sum: boolean): void {
  if (!(place >= 0 && place < values.length)) return
  values[place] = sum ? values[place]! + height : Math.max(values[place]!, height)
}

/** The grid that shows all features from first to last, with room for their flanks; none before the start of the run. */
export function gridOver(minutes: Float64Array, widthMinutes = DRAWN_WIDTH_MINUTES): EvenGrid {
  let first = Number.POSITIVE_INFINITY
  let last = Number.NEGATIVE_INFINITY
  for (const each of minutes) {
    if (each < first) first = each
    if (each > last) last = each
  }
  const stepMinutes = widthMinutes / 20
  if (first > last) return { firstMinutes: 0, stepMinutes, count: 0 }
  const start = Math.max(0, first - 3 * widthMinutes)
  const span = last + 3 * widthMinutes - start
  const step = Math.max(stepMinutes, span / (MOST_GRID_POINTS - 2))
  return { firstMinutes: start, stepMinutes: step, count: Math.ceil(span / step) + 1 }
}

/** The times of a grid. */
export function gridMinutes({ firstMinutes, stepMinutes, count }: EvenGrid): Float64Array {
  return Float64Array.from({ length: count }, (_, g) => firstMinutes + g * stepMinutes)
}
