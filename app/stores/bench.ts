import { initialView, isFilteredView, MOST_PICKED, withoutFilter, type BenchView } from '~/utils/benchView'
import { sortedAlsoBy, sortedBy, type SortKey } from '~/utils/featureOrder'
import type { PlotWindow } from '~/utils/plotWindow'
import type { Verdict } from '#shared/science/verdict/verdicts'

/** What is selected, picked, filtered, looked for, sorted and drawn on the bench: one truth for plots, bar, table and card. */
export const useBenchStore = defineStore('bench', {
  state: (): BenchView => initialView(),
  getters: {
    isFiltered: state => isFilteredView(state),
    /** The selected feature first, then those picked beside it. */
    looked: (state): number[] => [...(state.selected === null ? [] : [state.selected]), ...state.picked.filter(each => each !== state.selected)],
  },
  actions: {
    show(view: BenchView) {
      this.$patch(structuredClone(toRaw(view)))
    },
    /** Looks at one feature; those picked before are let go. */
    select(feature: number | null) {
      this.selected = feature
      this.picked = []
    },
    /** Takes a feature to those looked at, or away from them; the first one picked is the selected one. */
    pick(feature: number) {
      if (this.selected === null) this.selected = feature
      else if (this.selected === feature) this.select(this.picked[0] ?? null)
      else if (this.picked.includes(feature)) this.picked = this.picked.filter(each => each !== feature)
      else this.picked = [...this.picked, feature].sort((a, b) => a - b).slice(0, MOST_PICKED)
    },
    /** Looks at the first of these features, with as many of the others picked beside it as may be; gives how many were left out. */
    pickAll(features: readonly number[]): number {
      const [first, ...others] = features
      if (first === undefined) return 0
      this.selected = first
      this.picked = others.slice(0, MOST_PICKED).sort((a, b) => a - b)
      return others.length - this.picked.length
    },
    toggleVerdict(verdict: Verdict) {
      this.verdicts = this.verdicts.includes(verdict) ? this.verdicts.filter(each => each !== verdict) : [...this.verdicts, verdict]
    },
    /** A second time by the same column turns the order round. */
    sortBy(key: SortKey) {
      this.sort = sortedBy(this.sort, key)
    },
    /** Sorts by one more key where those before are equal. */
    sortAlsoBy(key: SortKey) {
      this.sort = sortedAlsoBy(this.sort, key)
    },
    /** Shows a part of the plot of ratios; null: all of it. */
    showWindow(shown: PlotWindow | null) {
      this.foldWindow = shown
      this.closeUp = false
    },
    /** Every plot shows the surroundings of the selected feature, or what it showed before. */
    toggleCloseUp() {
      this.closeUp = !this.closeUp && this.selected !== null
    },
    clearFilter() {
      this.$patch(withoutFilter())
    },
  },
})
