import { MOST_PICKED } from '~/utils/benchView'

/** How a move goes: without selecting, or picking all rows it passes. */
export interface RowMove { only?: boolean, extend?: boolean }

/**
 * Where one stands in the feature table, and what is selected and picked from there. Moving selects, so that plots and card
 * follow; once rows are picked it only moves, so that none is lost. Space picks, Enter selects one row alone.
 */
export function useRowCursor(rows: () => Int32Array, selectedRow: () => number) {
  const bench = useBenchStore()
  const at = ref<number | null>(null)
  const anchor = ref<number | null>(null)
  /** The selected row was picked by hand, so that moving on keeps it. */
  const isHeld = ref(false)
  const told = ref('')
  const isPicking = computed(() => isHeld.value || bench.picked.length > 0)
  const row = computed(() => at.value === null ? selectedRow() : rows().indexOf(at.value))

  watch(() => bench.selected, (selected) => {
    if (!isPicking.value || at.value === null) at.value = selected
    if (selected === null) isHeld.value = false
  }, { immediate: true })

  function selectOnly(feature: number | undefined) {
    if (feature === undefined) return
    bench.select(feature)
    at.value = anchor.value = feature
    isHeld.value = false
    told.value = ''
  }
  function pick(feature: number | undefined) {
    if (feature === undefined) return
    told.value = ''
    at.value = anchor.value = feature
    if (bench.selected === feature && !isPicking.value) {
      isHeld.value = true
      return
    }
    if (bench.picked.length >= MOST_PICKED && !bench.looked.includes(feature)) {
      told.value = `At most ${MOST_PICKED} rows can be picked beside the selected one.`
      return
    }
    bench.pick(feature)
    isHeld.value = bench.selected !== null
  }
  function pickTo(to: number) {
    const start = rows().indexOf(anchor.value ?? bench.selected ?? -1)
    const from = start < 0 ? to : start
    const between = rows().slice(Math.min(from, to), Math.max(from, to) + 1)
    if (between.length === 0) return
    const leftOut = bench.pickAll(from <= to ? [...between] : [...between].reverse())
    anchor.value = bench.selected
    at.value = rows()[to] ?? null
    isHeld.value = true
    told.value = leftOut > 0 ? `${MOST_PICKED + 1} rows picked: at most ${MOST_PICKED} beside the selected one, ${leftOut} left out.` : ''
  }
  /** Goes to a row, held within the table. */
  function goTo(to: number, { only = false, extend = false }: RowMove = {}) {
    const last = rows().length - 1
    if (last < 0) return
    const held = Math.max(0, Math.min(last, to))
    if (extend) pickTo(held)
    else if (only || isPicking.value) at.value = rows()[held] ?? null
    else selectOnly(rows()[held])
  }
  return {
    row, isPicking, told, goTo,
    move: (by: number, how?: RowMove) => goTo(row.value < 0 ? (by > 0 ? 0 : rows().length - 1) : row.value + by, how),
    select: () => selectOnly(rows()[row.value]),
    pickHere: () => pick(rows()[row.value]),
    pickAllRows: () => {
      anchor.value = rows()[0] ?? null
      pickTo(rows().length - 1)
    },
    /** A row that was pressed. */
    press: (index: number, { picks, extends: isRange }: { picks: boolean, extends: boolean }) => isRange ? pickTo(index) : picks ? pick(rows()[index]) : selectOnly(rows()[index]),
    letGo: () => selectOnly(bench.selected ?? undefined),
  }
}
