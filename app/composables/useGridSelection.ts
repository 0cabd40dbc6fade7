export interface GridPlace { row: number, column: number }

/** Where one stands in a grid, and the block from where a selection began. Rows go by key, so that they may move. */
export function useGridSelection(keys: Ref<string[]>, columns: number) {
  const active = ref({ key: '', column: 0 })
  const anchor = ref({ key: '', column: 0 })
  let lastRow = 0
  const rowOf = (key: string) => {
    const index = keys.value.indexOf(key)
    return index >= 0 ? index : Math.max(0, Math.min(lastRow, keys.value.length - 1))
  }
  const place = computed<GridPlace>(() => ({ row: rowOf(active.value.key), column: active.value.column }))
  const block = computed(() => {
    const from = { row: rowOf(anchor.value.key), column: anchor.value.column }
    const { row, column } = place.value
    return { top: Math.min(row, from.row), bottom: Math.max(row, from.row), left: Math.min(column, from.column), right: Math.max(column, from.column) }
  })

  /** Goes to a place, held inside the grid; `extend` keeps the other corner of the block. */
  function go({ row, column }: GridPlace, extend = false) {
    lastRow = Math.max(0, Math.min(row, keys.value.length - 1))
    active.value = { key: keys.value[lastRow] ?? '', column: Math.max(0, Math.min(column, columns - 1)) }
    if (!extend) anchor.value = { ...active.value }
  }
  const move = (rows: number, columnsOn: number, extend = false) => go({ row: place.value.row + rows, column: place.value.column + columnsOn }, extend)

  /** To the next cell in reading order; false at the end, so that the Tab key can leave. */
  function step(by: 1 | -1): boolean {
    const next = place.value.row * columns + place.value.column + by
    if (next < 0 || next >= keys.value.length * columns) return false
    go({ row: Math.floor(next / columns), column: next % columns })
    return true
  }

  function selectAll() {
    anchor.value = { key: keys.value[0] ?? '', column: 0 }
    go({ row: keys.value.length - 1, column: columns - 1 }, true)
  }
  return { place, block, go, move, step, selectAll }
}
