import { firstAbove, firstNotBelow } from '../numeric/firstPlace'

/** The part of a trace that is drawn, and how many columns of pixels it is drawn on. */
export interface DrawnWindow { fromMinutes: number, toMinutes: number, columns: number }

/** So many points are kept of a column: its first, lowest, highest and last. */
export const POINTS_A_COLUMN = 4

/**
 * Which points of a trace to draw, so that the drawing looks as if all were drawn: the window is cut into columns of equal
 * width, and of each its first, lowest, highest and last point are kept. So the highest point of every column, and with it
 * every peak top that can be seen, stays; a line through them covers the same pixels as a line through all.
 * One point on each side of the window is kept too, for the line to run to the edge.
 *
 * @param minutes ascending, ties allowed
 * @param values as many; what is no number is never highest or lowest, but stays a gap where it is first or last
 * @returns places in ascending order, at most 4 a column and 2; all of the window where it holds no more than that
 * @throws RangeError where the lengths differ or there is no column
 */
export function downSample(minutes: Float64Array, values: Float64Array, { fromMinutes, toMinutes, columns }: DrawnWindow): Int32Array {
  if (minutes.length !== values.length) throw new RangeError('A trace has as many values as times.')
  if (!(columns >= 1)) throw new RangeError('A trace is drawn on one column at least.')
  const start = firstNotBelow(minutes, fromMinutes)
  const end = firstAbove(minutes, toMinutes)
  const before = start > 0 ? [start - 1] : []
  const after = end < minutes.length ? [end] : []
  if (end - start <= POINTS_A_COLUMN * columns) return Int32Array.from([...before, ...range(start, end), ...after])

  const kept = new Int32Array(POINTS_A_COLUMN * columns + 2)
  let count = 0
  if (start > 0) kept[count++] = start - 1
  const perMinute = columns / (toMinutes - fromMinutes)
  let first = start
  while (first < end) {
    const column = columnAt(minutes[first]!, fromMinutes, perMinute, columns)
    let low = -1
    let high = -1
    let next = first
    for (; next < end && columnAt(minutes[next]!, fromMinutes, perMinute, columns) === column; next++) {
      if (high < 0 ? !Number.isNaN(values[next]!) : values[next]! > values[high]!) high = next
      if (low < 0 ? !Number.isNaN(values[next]!) : values[next]! < values[low]!) low = next
    }
    const last = next - 1
    kept[count++] = first
    const [one, other] = low < high ? [low, high] : [high, low]
    if (one > first && one < last) kept[count++] = one
    if (other > one && other > first && other < last) kept[count++] = other
    if (last > first) kept[count++] = last
    first = next
  }
  if (end < minutes.length) kept[count++] = end
  return kept.slice(0, count)
}

/** Column of a time within the window; the very end belongs to the last. */
function columnAt(minutes: number, fromMinutes: number, perMinute: number, columns: number): number {
  return Math.min(columns - 1, Math.floor((minutes - fromMinutes) * perMinute))
}

function range(start: number, end: number): number[] {
  return Array.from({ length: Math.max(0, end - start) }, (_, i) => start + i)
}
