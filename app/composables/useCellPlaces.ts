import type { StyleValue } from 'vue'
import { frozenThatFit } from '~/utils/columnLayout'

/** Beside frozen columns so much of the frame stays free to scroll in. */
const LEAST_FREE_REM = 7

/** Where each cell of a row stands in a frame so wide, and which of them stay while one scrolls sideways. */
export function useCellPlaces(columns: () => readonly { widthRem: number, grows?: boolean }[], frameRem: () => number) {
  const { layout } = useColumnLayout()
  const widths = computed(() => columns().map(({ widthRem }) => widthRem))
  const frozen = computed(() => frozenThatFit(widths.value, layout.value.frozen, frameRem(), LEAST_FREE_REM))
  const starts = computed(() => {
    let sum = 0
    return widths.value.map(width => (sum += width) - width)
  })
  return {
    frozen,
    starts,
    totalRem: computed(() => widths.value.reduce((sum, width) => sum + width, 0)),
    styles: computed((): StyleValue[] => columns().map(({ widthRem, grows }, place) => ({
      flex: `${grows ? 1 : 0} 0 ${widthRem}rem`, width: `${widthRem}rem`, ...(place < frozen.value ? { left: `${starts.value[place]}rem` } : {}),
    }))),
    classes: computed(() => columns().map((_, place) => place >= frozen.value ? '' : place === frozen.value - 1 ? 'sticky z-[1] bg-inherit border-r border-hairline' : 'sticky z-[1] bg-inherit')),
  }
}
