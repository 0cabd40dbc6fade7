import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it } from 'vitest'
import AbundanceView from '~/components/comparison/AbundanceView.vue'
import { VERDICT } from '#shared/science/verdict/verdicts'
import { initialView } from '~/utils/benchView'
import { manyVerdicts } from '../../support/manyFeatures'

const many = manyVerdicts(200)
const onlyA = many.result.columns.verdict.indexOf(VERDICT.onlyA)
const props = { result: many.result, data: many.input, first: 17, settings: many.settings, names: { a: 'Millrace', b: 'Tallow <Lane>' } }
const bench = () => useBenchStore()
beforeEach(() => bench().show(initialView()))

describe('the abundance plot', () => {
  it('says what to do where nothing is selected, and does it', async () => {
    const view = await mountSuspended(AbundanceView, { props })
    expect(view.text()).toContain('Pick one in the table')
    await view.get('button').trigger('click')
    expect(bench().selected).toBe(17)
    expect(view.text()).toContain('Abundance of m/z')
  })

  it('has nothing to offer where no feature passes the filter', async () => {
    const view = await mountSuspended(AbundanceView, { props: { ...props, first: undefined } })
    expect(view.find('button').exists()).toBe(false)
  })

  it('says that the intensities are on their way', async () => {
    bench().select(onlyA)
    const view = await mountSuspended(AbundanceView, { props: { ...props, data: null } })
    expect(view.get('[role=status]').text()).toContain('Reading the intensities')
  })

  it('draws every sample, tells it in words, and as a table', async () => {
    bench().select(onlyA)
    const view = await mountSuspended(AbundanceView, { props })
    expect(view.text()).toContain('Tallow <Lane>: found in 0 of 3.')
    expect(view.text()).toContain('not found')
    await view.get('button').trigger('click')
    expect(view.findAll('tbody tr')).toHaveLength(many.input.samples.length)
    expect(view.text()).not.toMatch(/NaN|Infinity|undefined/)
  })

  it('keeps its choices in the store, and so in the address', async () => {
    bench().select(onlyA)
    const view = await mountSuspended(AbundanceView, { props })
    await view.get('input[value=run]').setValue()
    await view.get('input[value=injected]').setValue()
    expect(bench().$state).toMatchObject({ abundanceLayout: 'run', signal: 'injected' })
    // The invented samples state no run order.
    expect(view.text()).toContain('Give it in the sample sheet')
    expect(view.find('svg').exists()).toBe(false)
  })
})
