import { benchDefaults, type BenchView } from '~/utils/benchView'
import type { SortKey } from '~/utils/featureOrder'
import type { Verdict } from '#shared/science/verdict/verdicts'

/** What is selected, filtered, looked for and sorted on the bench: one truth for plot, bar, table and card. */
export const useBenchStore = defineStore('bench', {
  state: (): BenchView => ({ ...benchDefaults, verdicts: [...benchDefaults.verdicts], sort: { ...benchDefaults.sort } }),
  getters: {
    isFiltered: state => state.verdicts.length > 0 || state.flags !== 'all' || state.find !== '',
  },
  actions: {
    show(view: BenchView) {
      this.$patch({ ...view, verdicts: [...view.verdicts], sort: { ...view.sort } })
    },
    select(feature: number | null) {
      this.selected = feature
    },
    toggleVerdict(verdict: Verdict) {
      this.verdicts = this.verdicts.includes(verdict) ? this.verdicts.filter(each => each !== verdict) : [...this.verdicts, verdict]
    },
    /** A second time by the same column turns the order round. */
    sortBy(key: SortKey) {
      const descending = this.sort.key === key ? !this.sort.descending : key === 'intensity' || key === 'reach'
      this.sort = { key, descending }
    },
    clearFilter() {
      this.verdicts = []
      this.flags = 'all'
      this.find = ''
    },
  },
})
