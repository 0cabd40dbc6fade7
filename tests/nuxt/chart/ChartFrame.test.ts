import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it, vi } from 'vitest'
import ChartFrame from '~/components/chart/ChartFrame.vue'

vi.mock('vue-echarts', () => ({ default: { name: 'VChart', props: ['option'], emits: ['click'], template: '<div class="drawing" />' } }))

const props = { title: 'Drift', description: 'Table 2 elutes 0.03 min later.', option: {}, height: 200 }

describe('ChartFrame', () => {
  it('names the drawing and says in words what it shows', async () => {
    const frame = await mountSuspended(ChartFrame, { props })
    const image = frame.get('[role=img]')
    const textOf = (attribute: string) => frame.get(`[id="${image.attributes(attribute)}"]`).text()
    expect(textOf('aria-labelledby')).toBe('Drift')
    expect(textOf('aria-describedby')).toBe('Table 2 elutes 0.03 min later.')
  })

  it('shows the table only on wish', async () => {
    const frame = await mountSuspended(ChartFrame, { props, slots: { default: () => 'all values' } })
    expect(frame.text()).not.toContain('all values')
    await frame.get('button').trigger('click')
    expect(frame.text()).toContain('all values')
    expect(frame.get('button').attributes('aria-expanded')).toBe('true')
  })

  it('offers no table where there is none', async () => {
    const frame = await mountSuspended(ChartFrame, { props })
    expect(frame.find('button').exists()).toBe(false)
  })
})
