import type { Corner } from '~/utils/plotArea'

/** What dragging on a plot does: nothing, so that a click picks; or draws a rectangle, a free outline, or the part to show. */
export const PLOT_MODES = ['pick', 'rectangle', 'lasso', 'zoom'] as const
export type PlotMode = (typeof PLOT_MODES)[number]

/** A box on the drawing, CSS pixels. */
export interface DragBox { left: number, top: number, width: number, height: number }

/** So far the pointer must go for a drag; less is a click. */
const LEAST_DRAG = 4
/** Between two corners of a trail. */
const LEAST_STEP = 2

/** The four corners of the rectangle between two places. */
export function rectangleBetween([x0, y0]: Corner, [x1, y1]: Corner): Corner[] {
  return [[x0, y0], [x1, y0], [x1, y1], [x0, y1]]
}

/**
 * Follows a drag over a drawing within the box it began in; Esc gives it up. `drawn` gets the outline in pixels.
 * Gives the outline so far, for drawing it, and the handlers of the pointer.
 */
export function usePlotDrag(drawn: (outline: Corner[], start: Corner) => void) {
  const outline = shallowRef<Corner[] | null>(null)
  let start: Corner | null = null
  let trail: Corner[] = []
  let box: DragBox | null = null
  let isLasso = false

  const clamp = ([x, y]: Corner, { left, top, width, height }: DragBox): Corner => [Math.min(left + width, Math.max(left, x)), Math.min(top + height, Math.max(top, y))]
  function end() {
    start = box = outline.value = null
    trail = []
    window.removeEventListener('keydown', onKey, true)
  }
  function onKey(event: KeyboardEvent) {
    if (event.key !== 'Escape') return
    // Esc is for the drag alone; the bench would clear its filter.
    event.preventDefault()
    event.stopPropagation()
    end()
  }
  onScopeDispose(end)

  return {
    outline,
    /** Is a drag under way, however short yet? */
    isDragging: () => start !== null,
    start(place: Corner, within: DragBox, lasso: boolean) {
      ;[start, box, isLasso] = [clamp(place, within), within, lasso]
      trail = [start]
      window.addEventListener('keydown', onKey, true)
    },
    move(place: Corner) {
      if (!start || !box) return
      const at = clamp(place, box)
      const [lastX, lastY] = trail.at(-1) ?? start
      if (Math.hypot(at[0] - lastX, at[1] - lastY) < LEAST_STEP) return
      trail = isLasso ? [...trail, at] : [start, at]
      const isDrag = outline.value !== null || Math.hypot(at[0] - start[0], at[1] - start[1]) >= LEAST_DRAG
      if (isDrag) outline.value = isLasso ? trail : rectangleBetween(start, at)
    },
    /** Ends the drag; gives false where it was but a click. */
    finish(): boolean {
      const [shape, from] = [outline.value, start]
      end()
      if (!shape || !from || shape.length < 3) return false
      drawn(shape, from)
      return true
    },
    giveUp: end,
  }
}
