import { areaRule } from '~/charts/foldArea'
import { placesOf } from '~/charts/foldPoints'
import type { Masses } from '#shared/science/mass/ionFits'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import type { FlagLine } from '#shared/types/flag'
import { filterFeatures, inOrder, rowOfFeature } from '~/utils/featureFilter'
import { orderFeatures } from '~/utils/featureOrder'
import { filterRules } from '~/utils/featureRules'
import { featuresWithFlag } from '~/utils/featuresWithFlag'

/** What the rows of the bench are made from; each asked for when it is needed. */
export interface FeatureRowSources {
  result: () => VerdictResult | null
  names: () => SideNames
  foldLimit: () => number
  masses: () => Masses
  flags: () => ReadonlyMap<number, FlagLine[]>
}

/** The features that pass the bench's filter, in its order, and the way from one to the next. */
export function useFeatureRows({ result, names, foldLimit, masses, flags }: FeatureRowSources) {
  const bench = useBenchStore()
  const none = new Int32Array(0)

  const order = computed(() => {
    const columns = result()?.columns
    if (!columns) return none
    const sorts = bench.sort.map(sort => ({ ...sort }))
    return orderFeatures(columns, sorts, sorts.some(({ key }) => key === 'flags') ? flags() : undefined)
  })
  // Kept apart from the order, so that sorting does not draw the plot anew.
  const passing = computed(() => {
    const columns = result()?.columns
    if (!columns) return none
    const rules = filterRules(bench, {
      columns,
      masses: masses(),
      flagged: bench.flags === 'all' ? new Set() : featuresWithFlag(flags(), bench.flags),
      said: i => verdictPhrase(columns.verdict[i] ?? 0, foldLimit(), names()),
    })
    if (bench.area) rules.push(areaRule(placesOf(columns), bench.area))
    return filterFeatures(columns, orderFeatures(columns, []), { verdicts: [...bench.verdicts], rules })
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
  return { rows, passing, selectedRow, step, selectRow }
}
