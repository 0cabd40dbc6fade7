import type { PointGrid } from '~/charts/pointGrid'
import type { Corner } from '~/utils/plotArea'

/** Pixels around the pointer in which a mark answers. */
const WITHIN = 12

/**
 * The marks of a plot as the pointer meets them: which it is over, where those looked at lie, and what a click does: it
 * selects a feature, and with Ctrl, Cmd or Shift picks it beside the others.
 *
 * @param drawing what lies over the marks; @param marks all of them, found by their place on it
 * @param markOf where a feature's mark lies; null where it is not drawn
 */
export function useMarks(drawing: () => HTMLElement | null, marks: () => PointGrid, markOf: (feature: number) => { x: number, y: number } | null) {
  const bench = useBenchStore()
  const all = computed(marks)
  const over = ref(-1)
  watch(all, () => over.value = -1)

  function placeOf(event: MouseEvent): Corner {
    const { left = 0, top = 0 } = drawing()?.getBoundingClientRect() ?? {}
    return [event.clientX - left, event.clientY - top]
  }
  const featureAt = (event: MouseEvent) => all.value.nearest(...placeOf(event), WITHIN)
  return {
    placeOf,
    hovered: computed(() => {
      const mark = over.value < 0 ? null : markOf(over.value)
      return mark && { ...mark, feature: over.value }
    }),
    selected: computed(() => bench.selected === null ? null : markOf(bench.selected)),
    picked: computed(() => bench.looked.filter(each => each !== bench.selected).flatMap(each => markOf(each) ?? [])),
    hover(event: PointerEvent) {
      if (event.pointerType !== 'touch') over.value = featureAt(event)
    },
    leave: () => over.value = -1,
    press(event: MouseEvent) {
      const feature = featureAt(event)
      if (feature < 0) return
      if (event.ctrlKey || event.metaKey || event.shiftKey) bench.pick(feature)
      else bench.select(feature)
    },
  }
}
