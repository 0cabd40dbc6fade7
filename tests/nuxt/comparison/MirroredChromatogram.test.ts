import { mountSuspended } from '@nuxt/test-utils/runtime'
import type { LineSeriesOption } from 'echarts/charts'
import type { EChartsOption } from 'echarts'
import type { VueWrapper } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import ChromatogramBrush from '~/components/comparison/ChromatogramBrush.vue'
import ChromatogramControls from '~/components/comparison/ChromatogramControls.vue'
import ChromatogramKey from '~/components/comparison/ChromatogramKey.vue'
import MirroredChromatogram from '~/components/comparison/MirroredChromatogram.vue'
import { plotFrame } from '~/charts/chromatogramWindow'
import type { BenchSource } from '~/utils/benchSource'
import { initialView } from '~/utils/benchView'
import { manyVerdicts } from '../../support/manyFeatures'

vi.mock('vue-echarts', () => ({ default: { name: 'VChart', props: ['option'], template: '<div class="drawing" />' } }))

const names = { a: 'Millrace', b: 'Tallow Lane' }
const many = manyVerdicts(300)
const rows = Int32Array.from({ length: 300 }, (_, i) => i)
const minutes = Float64Array.from({ length: 1000 }, (_, i) => i / 50)
const flat = (value: number) => new Float64Array(1000).fill(value)

function sourceWith(rest: Partial<BenchSource>): BenchSource {
  const { counts, cautions } = many.result
  const version: BenchSource['version'] = {
    number: 1, sideAName: names.a, sideBName: names.b, counts, cautions, settings: many.settings, samples: [...many.input.samples], engineVersion: '1', polarity: 'negative', massKind: 'mz', alignMassPpm: 10, createdAt: '2026-12-01T12:00:00.000Z',
  }
  return { title: 'Apple juices', study: null, version, exportNotes: () => [], loadVerdicts: async () => many.result, loadData: null, loadTraces: null, loadExtracted: null, ...rest }
}
const mountWith = (rest: Partial<BenchSource> = {}, data: typeof many.input | null = many.input) =>
  mountSuspended(MirroredChromatogram, { props: { source: sourceWith(rest), result: many.result, data, rows, settings: many.settings, names, flagged: new Set([3]) } })
/** Drawing gives way to the page, so what is shown is waited for. */
const patient = { timeout: 30_000 }
const shows = (chart: VueWrapper, text: string) => expect.poll(() => chart.text(), patient).toContain(text)
const drawn = (chart: VueWrapper, lines: number) => expect.poll(() => linesOf(chart), patient).toHaveLength(lines)
const linesOf = (chart: VueWrapper) => {
  const { series } = chart.findComponent({ name: 'ChartFrame' }).props('option') as EChartsOption
  return (series as LineSeriesOption[]).filter(({ id }) => String(id).startsWith('line-'))
}
/** Everything is in view at once. */
class AllInView implements Pick<IntersectionObserver, 'observe' | 'unobserve' | 'disconnect'> {
  constructor(private readonly seen: IntersectionObserverCallback) {}
  observe(target: Element) {
    const entry = { isIntersecting: true, target } as IntersectionObserverEntry
    this.seen([entry], this as unknown as IntersectionObserver)
  }

  unobserve() {}
  disconnect() {}
}
beforeEach(() => {
  vi.stubGlobal('IntersectionObserver', AllInView)
  useBenchStore().show(initialView())
})

describe('the mirrored chromatogram', () => {
  it('is drawn from features where there are no traces, and says so', async () => {
    const chart = await mountWith()
    await drawn(chart, 8)
    await shows(chart, 'Mirrored chromatogram: base peak (BPC), drawn from features')
    expect(chart.text()).toContain('No raw data: the highest of the features')
    expect(chart.text()).not.toContain('Taken from')
  })

  it('waits for intensities', async () => {
    const chart = await mountWith({}, null)
    await shows(chart, 'Reading traces …')
  })

  it('draws measured traces of the samples that have them, and names those that have none', async () => {
    const loadTraces = async () => [0, 3].map(position => ({ position, minutes, total: flat(10), base: flat(4) }))
    const chart = await mountWith({ loadTraces })
    await drawn(chart, 4)
    expect(chart.text()).toContain('Mirrored chromatogram: base peak (BPC)')
    expect(chart.text()).not.toContain('drawn from features')
    expect(chart.text()).toContain('Without a trace: M2, M3, T2, T3.')
    useBenchStore().traceOrigin = 'features'
    await shows(chart, 'drawn from features')
  })

  it('asks for the traces of what is looked at, once', async () => {
    const asked: number[][] = []
    const chart = await mountWith({
      loadTraces: async () => [{ position: 0, minutes, total: flat(10), base: flat(4) }],
      loadExtracted: async (features) => {
        asked.push([...features])
        return features.map(feature => ({ position: 0, feature, minutes, values: flat(feature) }))
      },
    })
    useBenchStore().traceKind = 'extracted'
    await shows(chart, 'Select a feature to see its trace.')
    useBenchStore().select(5)
    await expect.poll(() => asked, patient).toEqual([[5]])
    // As an address of another alignment may have it: what is not here is not asked for.
    useBenchStore().picked = [8, 900_000]
    await expect.poll(() => asked, patient).toEqual([[5], [8]])
    await expect.poll(() => chart.findComponent(ChromatogramKey).exists() && chart.findComponent(ChromatogramKey).text(), patient).toContain('m/z')
    await drawn(chart, 4)
  })

  it('says why traces could not be read', async () => {
    const chart = await mountWith({ loadTraces: async () => Promise.reject(new Error('Something went wrong on this page.')) })
    await shows(chart, 'Something went wrong on this page.')
  })

  it('zooms by buttons and back, the store holding the part of the run', async () => {
    const bench = useBenchStore()
    const chart = await mountWith()
    await drawn(chart, 8)
    const press = (name: string) => chart.findAll('button').find(button => button.attributes('aria-label') === name || button.text() === name)?.trigger('click')
    await press('Zoom in')
    const [from = 0, to = 0] = bench.traceWindow ?? []
    expect(to - from).toBeGreaterThan(5)
    await press('Earlier')
    expect(bench.traceWindow?.[0]).toBeLessThan(from)
    await press('Whole run')
    expect(bench.traceWindow).toBeNull()
  })

  it('shows the surroundings of the selected feature in a close-up, until another part is asked for', async () => {
    const bench = useBenchStore()
    bench.select(7)
    const chart = await mountWith()
    await drawn(chart, 8)
    await chart.findAll('button').find(button => button.text() === 'To the feature')?.trigger('click')
    expect(bench.closeUp).toBe(true)
    const [from, to] = chart.findComponent(ChromatogramControls).props('window')
    const top = many.result.columns.retentionMinutes[7] ?? 0
    expect(from).toBeLessThanOrEqual(top)
    expect(to).toBeGreaterThanOrEqual(top)
    expect(to - from).toBeCloseTo(1, 6)
    await chart.findAll('button').find(button => button.attributes('aria-label') === 'Later')?.trigger('click')
    expect(bench.closeUp).toBe(false)
    expect(bench.traceWindow?.[0]).toBeCloseTo(from + 0.5, 2)
  })

  it('selects the peak that is clicked, and only among features that pass the filter', async () => {
    const chart = await mountSuspended(MirroredChromatogram, { props: { source: sourceWith({}), result: many.result, data: many.input, rows: Int32Array.of(42), settings: many.settings, names, flagged: new Set<number>() } })
    await drawn(chart, 8)
    const top = many.result.columns.retentionMinutes[42] ?? 0
    chart.findComponent(ChromatogramBrush).vm.$emit('pick', top, 'A', false)
    expect(useBenchStore().selected).toBe(42)
    useBenchStore().select(null)
    chart.findComponent(ChromatogramBrush).vm.$emit('pick', top + 5, 'A', false)
    expect(useBenchStore().selected).toBeNull()
  })

  it('gives the highest point of each line as a table', async () => {
    const chart = await mountWith()
    await drawn(chart, 8)
    await chart.findAll('button').find(button => button.text() === 'Show as table')?.trigger('click')
    expect(chart.findAll('tbody tr')).toHaveLength(8)
    expect(chart.get('tbody tr').text()).toMatch(/^A Millracemean\d+\.\d\d/)
    expect(chart.text()).not.toMatch(/NaN|Infinity|undefined/)
  })
})

describe('the controls of the chromatogram', () => {
  const props = { window: [2, 6] as const, run: [0, 20] as const, hasTraces: true, maySeek: true }
  const fieldOf = (controls: VueWrapper, label: string) => controls.get(`[id="${controls.findAll('label').find(each => each.text() === label)?.attributes('for')}"]`)

  it('takes typed minutes, with a comma too', async () => {
    const controls = await mountSuspended(ChromatogramControls, { props })
    await fieldOf(controls, 'To').setValue('7,5')
    await controls.get('form').trigger('submit')
    expect(controls.emitted('show')?.at(-1)).toEqual([[2, 7.5]])
  })

  it('refuses a from after the to', async () => {
    const controls = await mountSuspended(ChromatogramControls, { props })
    await fieldOf(controls, 'From').setValue('9')
    await controls.get('form').trigger('submit')
    expect(controls.text()).toContain('“From” must lie before “to”.')
    expect(controls.emitted('show')).toBeUndefined()
  })

  it('offers only what can be done', async () => {
    const controls = await mountSuspended(ChromatogramControls, { props: { ...props, window: props.run, maySeek: false } })
    const disabled = controls.findAll('button[disabled]').map(button => button.attributes('aria-label') ?? button.text())
    expect(disabled).toEqual(['Zoom out', 'Earlier', 'Later', 'Whole run', 'To the feature'])
  })
})

describe('the brush', () => {
  const frame = plotFrame(false)
  const width = 100 + frame.left + frame.right
  const mountBrush = () => mountSuspended(ChromatogramBrush, { props: { frame, window: [0, 10], width, height: 300, hint: (_: number, side: 'A' | 'B') => `peak of ${side}` }, attachTo: document.body })
  const at = (x: number, y = 20) => ({ clientX: frame.left + x, clientY: y, button: 0, pointerType: 'mouse', pointerId: 1 })

  it('takes a part of the run, drawn either way', async () => {
    const brush = await mountBrush()
    Object.assign(brush.element, { setPointerCapture: () => undefined })
    await brush.trigger('pointerdown', at(60))
    await brush.trigger('pointermove', at(20))
    expect(brush.text()).toBe('2.00 to 6.00 min')
    await brush.trigger('pointerup', at(20))
    expect(brush.emitted('zoom')).toEqual([[[2, 6]]])
    expect(brush.emitted('pick')).toBeUndefined()
  })

  it('means a peak where nothing was drawn, on the half that was clicked', async () => {
    const brush = await mountBrush()
    Object.assign(brush.element, { setPointerCapture: () => undefined })
    await brush.trigger('pointerdown', at(50, 250))
    await brush.trigger('pointerup', at(52, 250))
    const [time, side, beside] = (brush.emitted('pick')?.[0] ?? []) as [number, string, boolean]
    expect([Number(time.toFixed(1)), side, beside]).toEqual([5.2, 'B', false])
  })

  it('tells the time and the peak under the pointer, and nothing once it is gone', async () => {
    const brush = await mountBrush()
    await brush.trigger('pointermove', at(30))
    expect(brush.text()).toBe('3.00 min · peak of A')
    await brush.trigger('pointerleave')
    expect(brush.text()).toBe('')
  })
})
