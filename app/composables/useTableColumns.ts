import { chosenColumns, featureColumns, type ColumnSources } from '~/utils/featureColumns'

/** The columns of the feature table as chosen, for the rows, for copies and exports. */
export function useTableColumns(sources: () => ColumnSources | null) {
  const { layout } = useColumnLayout()
  const given = computed(sources)
  const all = computed(() => given.value ? featureColumns(given.value) : [])
  const columns = computed(() => given.value ? chosenColumns(all.value, layout.value.shown, layout.value.frozen, given.value) : [])
  return { all, columns }
}
