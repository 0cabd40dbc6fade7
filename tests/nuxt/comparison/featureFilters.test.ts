import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it } from 'vitest'
import FilterChips from '~/components/comparison/FilterChips.vue'
import FilterPanel from '~/components/comparison/FilterPanel.vue'
import { initialView } from '~/utils/benchView'
import { filterWords } from '~/utils/filterWords'

const negative = { polarity: 'negative', massKind: 'mz' } as const
beforeEach(() => useBenchStore().show(initialView()))

describe('the filters by numbers', () => {
  const mount = async () => {
    const panel = await mountSuspended(FilterPanel, { props: { masses: negative } })
    const field = (legend: string, label: string) => {
      const group = panel.findAll('fieldset').find(each => each.get('legend').text() === legend)
      return panel.get<HTMLInputElement>(`[id="${group?.findAll('label').find(each => each.text() === label)?.attributes('for')}"]`)
    }
    const type = async (legend: string, label: string, text: string) => {
      await field(legend, label).setValue(text)
    }
    return { panel, field, type }
  }

  it('takes from and to with a comma or a point, once the field is left', async () => {
    const { field, type } = await mount()
    field('Minutes', 'from').element.value = '4,5'
    await field('Minutes', 'from').trigger('input')
    expect(useBenchStore().minutes).toEqual({ from: null, to: null })
    await type('Minutes', 'from', '4,5')
    await type('Minutes', 'to', '5.25')
    expect(useBenchStore().minutes).toEqual({ from: 4.5, to: 5.25 })
    expect(useBenchStore().isFiltered).toBe(true)
  })

  it('takes a mass with its tolerance, and lets it go when it is emptied', async () => {
    const { type, panel } = await mount()
    await type('Neutral mass', 'at', '436,1369')
    expect(useBenchStore().massNear).toEqual({ value: 436.1369, ppm: 5 })
    await type('Neutral mass', 'within', '3')
    expect(useBenchStore().massNear).toEqual({ value: 436.1369, ppm: 3 })
    expect(panel.text()).toContain('[M−H]⁻')
    await type('Neutral mass', 'at', '')
    expect(useBenchStore().massNear).toBeNull()
  })

  it('keeps what is no formula to itself, and says why', async () => {
    const { panel, type } = await mount()
    await type('Formula', 'of the molecule', 'C21H24O10')
    expect(useBenchStore().formula).toEqual({ formula: 'C21H24O10', ppm: 5 })
    await type('Formula', 'of the molecule', 'C21Hx')
    expect(panel.get('[role=alert]').text()).toContain('holds Hx, which has no mass here')
    expect(useBenchStore().formula?.formula).toBe('C21H24O10')
  })

  it('empties its fields when the filter is cleared', async () => {
    const { field, type } = await mount()
    await type('q', 'to', '0.05')
    useBenchStore().clearFilter()
    await nextTick()
    expect(field('q', 'to').element.value).toBe('')
  })
})

describe('the filters that stand', () => {
  it('are taken away one by one', async () => {
    const bench = useBenchStore()
    bench.$patch({ verdicts: ['onlyA', 'level'], q: { from: null, to: 0.05 }, mzNear: { value: 313.07, ppm: 10 } })
    const chips = await mountSuspended(FilterChips, { props: { filters: filterWords(bench.$state, 1, { a: 'Millrace', b: 'Tallow Lane' }) } })
    for (const words of ['level within ×2', 'q at most 0.05', 'm/z 313.07']) await chips.findAll('button').find(each => each.text().startsWith(words))?.trigger('click')
    expect({ verdicts: bench.verdicts, q: bench.q, mzNear: bench.mzNear }).toEqual({ verdicts: ['onlyA'], q: { from: null, to: null }, mzNear: null })
  })
})
