import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import { areaRule } from '~/charts/foldArea'
import { placesOf } from '~/charts/foldPoints'
import { filterFeatures, inOrder, rowOfFeature } from '~/utils/featureFilter'
import { orderFeatures } from '~/utils/featureOrder'
import { parseSearch } from '~/utils/featureSearch'

/** The features that pass the bench's filter, in its order, and the way from one to the next. */
export function useFeatureRows(result: () => VerdictResult | null, names: () => SideNames, foldLimit: () => number, flagged: () => ReadonlySet<number>) {
  const bench = useBenchStore()
  const none = new Int32Array(0)

  const order = computed(() => {
    const columns = result()?.columns
    return columns ? orderFeatures(columns, { ...bench.sort }) : none
  })
  // Kept apart from the order, so that sorting does not draw the plot anew.
  const passing = computed(() => {
    const columns = result()?.columns
    if (!columns) return none
    return filterFeatures(columns, orderFeatures(columns, { key: 'number', descending: false }), {
      verdicts: [...bench.verdicts],
      flagged: bench.flags !== 'all' ? flagged() : null,
      inside: bench.area && areaRule(placesOf(columns), bench.area),
      search: parseSearch(bench.find, bench.massPpm),
      said: i => verdictPhrase(columns.verdict[i] ?? 0, foldLimit(), names()),
    })
  })
  const rows = computed(() => inOrder(passing.value, order.value))
  const place = computed(() => rowOfFeature(rows.value, order.value.length))
  const selectedRow = computed(() => bench.selected === null ? -1 : place.value[bench.selected] ?? -1)

  /** Selects the row so many further on; from nowhere, the first or last. */
  function step(by: number) {
    const last = rows.value.length - 1
    if (last < 0) return
    const from = selectedRow.value < 0 ? (by > 0 ? -1 : last + 1) : selectedRow.value
    selectRow(Math.min(last, Math.max(0, from + by)))
  }
  function selectRow(row: number) {
    const feature = rows.value[row]
    if (feature !== undefined) bench.select(feature)
  }
  return { rows, passing, selectedRow, step, selectRow, toEdge: (end: boolean) => selectRow(end ? rows.value.length - 1 : 0) }
}
