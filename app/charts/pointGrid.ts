/** Points on a drawing, found by their place: which is nearest, without looking at all of them. */
export interface PointGrid {
  /** The id of the nearest point at most `within` away (ties: the point given first); −1 where there is none. */
  nearest: (x: number, y: number, within: number) => number
}

/**
 * Sorts points into square cells by counting, once; a search looks at the cells around its place only.
 *
 * @param x pixels, one a point; @param y likewise; points that are no number are left out
 * @param ids what `nearest` gives for each point
 * @param cell width of a cell, pixels; about the distance that is asked for later
 */
export function pointGrid(x: ArrayLike<number>, y: ArrayLike<number>, ids: ArrayLike<number>, cell = 12): PointGrid {
  const ends = { left: Number.POSITIVE_INFINITY, right: Number.NEGATIVE_INFINITY, top: Number.POSITIVE_INFINITY, bottom: Number.NEGATIVE_INFINITY }
  for (let i = 0; i < ids.length; i++) {
    if (!Number.isFinite(x[i]! + y[i]!)) continue
    if (x[i]! < ends.left) ends.left = x[i]!
    if (x[i]! > ends.right) ends.right = x[i]!
    if (y[i]! < ends.top) ends.top = y[i]!
    if (y[i]! > ends.bottom) ends.bottom = y[i]!
  }
  if (ends.left > ends.right) return { nearest: () => -1 }
  const columns = Math.floor((ends.right - ends.left) / cell) + 1
  const rows = Math.floor((ends.bottom - ends.top) / cell) + 1
  const cellOf = (i: number) => Number.isFinite(x[i]! + y[i]!) ? Math.floor((y[i]! - ends.top) / cell) * columns + Math.floor((x[i]! - ends.left) / cell) : -1

  const start = new Int32Array(columns * rows + 1)
  for (let i = 0; i < ids.length; i++) start[cellOf(i) + 1]! += 1
  // What is no number was counted in front of the first cell.
  start[0] = 0
  for (let at = 1; at < start.length; at++) start[at]! += start[at - 1]!
  const next = start.slice()
  const order = new Int32Array(start[start.length - 1]!)
  for (let i = 0; i < ids.length; i++) {
    const at = cellOf(i)
    if (at >= 0) order[next[at]!++] = i
  }

  return {
    nearest(px, py, within) {
      let found = -1
      let least = within * within
      const [fromColumn, toColumn] = range(px - ends.left, within, cell, columns)
      const [fromRow, toRow] = range(py - ends.top, within, cell, rows)
      for (let row = fromRow; row <= toRow; row++) {
        for (let at = start[row * columns + fromColumn]!; at < start[row * columns + toColumn + 1]!; at++) {
          const i = order[at]!
          const distance = (x[i]! - px) ** 2 + (y[i]! - py) ** 2
          if (distance < least || (distance === least && (found < 0 || i < found))) [found, least] = [i, distance]
        }
      }
      return found < 0 ? -1 : ids[found]!
    },
  }
}

/** The cells that a distance around a place touches; from after to where it touches none. */
function range(place: number, within: number, cell: number, count: number): [number, number] {
  return [Math.max(0, Math.floor((place - within) / cell)), Math.min(count - 1, Math.floor((place + within) / cell))]
}
