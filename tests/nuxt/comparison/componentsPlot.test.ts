import { mountSuspended } from '@nuxt/test-utils/runtime'
import { enableAutoUnmount, flushPromises } from '@vue/test-utils'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import BenchPlot from '~/components/comparison/BenchPlot.vue'
import { farthestLoadings } from '~/charts/componentLoadingsText'
import { loadingMark } from '~/charts/loadingFrame'
import ComponentsPlot from '~/components/comparison/ComponentsPlot.vue'
import LoadingsOverlay from '~/components/comparison/LoadingsOverlay.vue'
import { sampleComponents } from '#shared/science/components/sampleComponents'
import { initialView } from '~/utils/benchView'
import type { ComponentsReport, ComponentsWork } from '~/utils/componentsWork'
import { manyVerdicts } from '../../support/manyFeatures'

vi.mock('vue-echarts', () => ({ default: { name: 'VChart', props: ['option'], emits: ['click'], template: '<div class="drawing" />' } }))

/** Stands for the browser's worker: keeps what it was sent until the test lets it answer, with the same science. */
class HeldWorker {
  static made: HeldWorker[] = []
  onmessage: ((event: { data: ComponentsReport }) => void) | null = null
  onerror: (() => void) | null = null
  received: ComponentsWork[] = []
  intensity: readonly Float64Array[] = []
  terminated = false
  constructor() {
    HeldWorker.made.push(this)
  }

  postMessage(work: ComponentsWork) {
    this.received.push(work)
    if (work.intensity) this.intensity = work.intensity
  }

  terminate() {
    this.terminated = true
  }

  async answer(position = this.received.length - 1) {
    const work = this.received[position]
    if (!work) throw new Error('nothing was asked')
    const { run, ask: { samples, ...rest } } = work
    this.onmessage?.({ data: { run, result: sampleComponents({ ...rest, intensity: samples.map(sample => this.intensity[sample] ?? new Float64Array(0)) }) } })
    await flushPromises()
  }
}
const lastWorker = () => {
  const worker = HeldWorker.made.at(-1)
  if (!worker) throw new Error('no worker was made')
  return worker
}

const many = manyVerdicts(300, { perSide: 5 })
const props = { result: many.result, rows: Int32Array.from({ length: 300 }, (_, i) => i), data: many.input, settings: many.settings, names: { a: 'Millrace', b: 'Tallow Lane' } }
const mountPlot = (more: Partial<typeof props> = {}) => mountSuspended(ComponentsPlot, { props: { ...props, ...more } })

beforeEach(() => {
  HeldWorker.made = []
  vi.stubGlobal('Worker', HeldWorker)
  useBenchStore().show(initialView())
})
afterEach(() => vi.unstubAllGlobals())
enableAutoUnmount(afterEach)

describe('the plot of principal components', () => {
  it('computes beside the page, says how far it is, then draws scores and loadings and what they rest on', async () => {
    const plot = await mountPlot()
    expect(plot.get('[role=progressbar]').attributes('aria-label')).toContain('Starting')
    lastWorker().onmessage?.({ data: { run: lastWorker().received[0]?.run ?? 0, share: 0.4, what: 'Comparing the samples' } })
    await flushPromises()
    expect(plot.get('[role=progressbar]').attributes('aria-valuenow')).toBe('40')
    await lastWorker().answer()
    expect(plot.find('[role=progressbar]').exists()).toBe(false)
    expect(plot.findAll('figure')).toHaveLength(2)
    expect(plot.text()).toMatch(/Variance: PC1 [\d.]+ %, PC2/)
    expect(plot.text()).toContain('were not detected and are filled with half the feature’s minimum')
    expect(plot.text()).toContain('Ellipses hold 95 % of samples like those of Millrace (5), Tallow Lane (5).')
    expect(plot.text()).not.toMatch(/NaN|Infinity|undefined/)
  })

  it('gives both as tables, and selects a feature from there', async () => {
    const plot = await mountPlot()
    await lastWorker().answer()
    for (const button of plot.findAll('figure figcaption button')) await button.trigger('click')
    const [scores, loadings] = plot.findAll('table')
    expect(scores?.findAll('tbody tr')).toHaveLength(10)
    const feature = loadings?.get('tbody button')
    await feature?.trigger('click')
    const { selected } = useBenchStore()
    expect(selected).not.toBeNull()
    expect(feature?.text()).toContain(many.input.mz[selected ?? 0]?.toFixed(4))
    expect(feature?.attributes('aria-pressed')).toBe('true')
  })

  it('hints at the mark under the pointer, selects the one that is clicked, picks a second one beside it', async () => {
    const plot = await mountPlot()
    await lastWorker().answer()
    const overlay = plot.getComponent(LoadingsOverlay)
    const { frame, points } = overlay.props()
    const [first = -1, second = -1] = farthestLoadings(points, 2).map(({ feature }) => feature)
    const at = (feature: number) => {
      const mark = loadingMark(frame, points, feature)
      return { clientX: mark?.x, clientY: mark?.y }
    }
    await overlay.trigger('pointermove', at(first))
    expect(overlay.text()).toContain(`m/z ${many.input.mz[first]?.toFixed(4)}`)
    await overlay.trigger('click', at(first))
    expect(useBenchStore().selected).toBe(first)
    await overlay.trigger('click', { ...at(second), ctrlKey: true })
    expect(useBenchStore().looked).toEqual([first, second])
    expect(overlay.findAll('circle')).toHaveLength(3)
    await overlay.trigger('click', { clientX: 1, clientY: 1 })
    expect(useBenchStore().selected).toBe(first)
  })

  it('closes up on the selected feature, and back', async () => {
    const plot = await mountPlot()
    await lastWorker().answer()
    const { points, frame: whole } = plot.getComponent(LoadingsOverlay).props()
    useBenchStore().select(points.features[3] ?? null)
    useBenchStore().closeUp = true
    await flushPromises()
    const { frame } = plot.getComponent(LoadingsOverlay).props()
    expect(frame.pane.x[1] - frame.pane.x[0]).toBeLessThan(whole.pane.x[1] - whole.pane.x[0])
    await plot.findAll('button').find(button => button.text() === 'Whole plot')?.trigger('click')
    expect(useBenchStore().closeUp).toBe(false)
  })

  it('lets further samples take part, without sending the intensities again', async () => {
    const plot = await mountPlot()
    await lastWorker().answer()
    expect(lastWorker().received[0]?.ask.samples).toHaveLength(10)
    await plot.get('input[type=checkbox][value=blank]').setValue(true)
    expect(useBenchStore().componentGroups).toEqual(['pooledQc', 'blank'])
    expect(HeldWorker.made).toHaveLength(1)
    expect(lastWorker().received[1]).toMatchObject({ intensity: null, ask: { samples: expect.objectContaining({ length: 12 }) } })
    await lastWorker().answer()
    expect(plot.text()).toContain('in 12 samples')
  })

  it('ends a run that is no longer asked for, and takes no late answer of it', async () => {
    const plot = await mountPlot()
    const first = lastWorker()
    useBenchStore().componentScaling = 'pareto'
    await flushPromises()
    expect(first.terminated).toBe(true)
    expect(HeldWorker.made).toHaveLength(2)
    expect(lastWorker().received[0]?.ask.scaling).toBe('pareto')
    expect(lastWorker().received[0]?.intensity).not.toBeNull()
    await first.answer()
    expect(plot.find('figure').exists()).toBe(false)
    await lastWorker().answer()
    expect(plot.findAll('figure')).toHaveLength(2)
    plot.unmount()
    expect(lastWorker().terminated).toBe(true)
  })

  it('says in a sentence that the browser stopped it, and tries anew with the next choice', async () => {
    const plot = await mountPlot()
    lastWorker().onerror?.()
    await flushPromises()
    expect(plot.get('[role=alert]').text()).toContain('could not be computed')
    useBenchStore().componentFeatures = 'bothSides'
    await flushPromises()
    await lastWorker().answer()
    expect(plot.find('[role=alert]').exists()).toBe(false)
    expect(plot.text()).toContain('features present in both sides')
  })

  it('shows other components, the pair never twice the same', async () => {
    const plot = await mountPlot()
    await lastWorker().answer()
    const across = plot.findAll('label').find(label => label.text() === 'Across')
    await plot.get(`[id="${across?.attributes('for')}"]`).setValue('2')
    expect(useBenchStore().componentPair).toEqual({ across: 2, upwards: 1 })
    expect(plot.text()).toContain('Across PC2 (')
    expect(HeldWorker.made[0]?.received).toHaveLength(1)
  })

  it('says that two samples have one component', async () => {
    const single = manyVerdicts(100, { perSide: 1 })
    const plot = await mountPlot({ result: single.result, data: single.input, settings: single.settings, rows: props.rows.slice(0, 100) })
    await lastWorker().answer()
    expect(plot.text()).toContain('with a third there is a plane')
  })
})

describe('its tab', () => {
  it('is there, and waits for the intensities', async () => {
    useBenchStore().plot = 'components'
    const plot = await mountSuspended(BenchPlot, { props: { ...props, data: null, saved: many.settings, draft: null, flagged: new Set<number>() } })
    expect(plot.findAll('[role=tab]').map(tab => tab.text())).toContain('Components')
    expect(plot.text()).toContain('Reading the intensities')
    expect(HeldWorker.made).toHaveLength(0)
  })
})
