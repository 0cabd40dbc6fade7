import type { Corner } from '~/utils/plotArea'

/**
 * A question to a point: does it lie inside the outline, its edge included? By the winding number (Hormann & Agathos 2001,
 * Comput Geom 20:131), so that a loop drawn over itself is inside as a whole. Fewer than three corners hold nothing.
 */
export function insideOutline(corners: readonly Corner[]): (x: number, y: number) => boolean {
  const count = corners.length
  if (count < 3) return () => false
  const xs = Float64Array.from(corners, ([x]) => x)
  const ys = Float64Array.from(corners, ([, y]) => y)
  const [left, right, low, high] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  return (x, y) => {
    if (!(x >= left && x <= right && y >= low && y <= high)) return false
    let winding = 0
    for (let i = 0, before = count - 1; i < count; before = i++) {
      const x0 = xs[before]!
      const y0 = ys[before]!
      const x1 = xs[i]!
      const y1 = ys[i]!
      const turn = (x1 - x0) * (y - y0) - (x - x0) * (y1 - y0)
      if (turn === 0 && x >= Math.min(x0, x1) && x <= Math.max(x0, x1) && y >= Math.min(y0, y1) && y <= Math.max(y0, y1)) return true
      if (y0 <= y) {
        if (y1 > y && turn > 0) winding++
      }
      else if (y1 <= y && turn < 0) winding--
    }
    return winding !== 0
  }
}

/**
 * An outline with at most so many corners: again and again the corner goes whose triangle with its neighbours is smallest
 * (Visvalingam & Whyatt 1993, Cartogr J 30:46). The corners left are corners of the outline, in its order.
 */
export function simplifyOutline(corners: readonly Corner[], most: number): Corner[] {
  const left = corners.slice()
  const sizeAt = (i: number) => {
    const [ax, ay] = left[(i + left.length - 1) % left.length] ?? [0, 0]
    const [bx, by] = left[i] ?? [0, 0]
    const [cx, cy] = left[(i + 1) % left.length] ?? [0, 0]
    return Math.abs((bx - ax) * (cy - ay) - (cx - ax) * (by - ay))
  }
  while (left.length > Math.max(3, most)) {
    let least = 0
    let size = Number.POSITIVE_INFINITY
    for (let i = 0; i < left.length; i++) {
      const own = sizeAt(i)
      if (own < size) [least, size] = [i, own]
    }
    left.splice(least, 1)
  }
  return left
}
