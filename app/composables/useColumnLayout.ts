import { useLocalStorage } from '@vueuse/core'
import { DEFAULT_LAYOUT, readLayout, writeLayout, type ColumnLayout } from '~/utils/columnLayout'

/**
 * The columns of the feature table: those the address names, else those a person chose last in this browser. Only what a person
 * chooses is kept, not what a link brought.
 */
export function useColumnLayout() {
  const bench = useBenchStore()
  const kept = useLocalStorage('steelyard-feature-columns', '')
  const layout = computed<ColumnLayout>({
    get: () => bench.columns,
    set: (next) => {
      bench.columns = next
      kept.value = isDefault(next) ? '' : writeLayout(next)
    },
  })
  /** To be called where the table comes to stand, in the browser only. */
  function takeKept() {
    if (isDefault(bench.columns)) bench.columns = readLayout(kept.value) ?? DEFAULT_LAYOUT
  }
  return { layout, takeKept }
}

const isDefault = (layout: ColumnLayout) => writeLayout(layout) === writeLayout(DEFAULT_LAYOUT)
