import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { markOf, foldFrame } from '~/charts/foldFrame'
import { PLACE, placesOf } from '~/charts/foldPoints'
import FoldPlot from '~/components/comparison/FoldPlot.vue'
import { initialView } from '~/utils/benchView'
import { manyVerdicts } from '../../support/manyFeatures'

vi.mock('vue-echarts', () => ({ default: { name: 'VChart', props: ['option'], template: '<div class="drawing" />' } }))

const many = manyVerdicts(400)
const points = placesOf(many.result.columns)
const rows = Int32Array.from({ length: 400 }, (_, i) => i)
const onRatios = points.place.indexOf(PLACE.ratios)
const props = { result: many.result, rows, settings: many.settings, saved: many.settings, mayPreview: true, names: { a: 'Millrace', b: 'Tallow Lane' }, flagged: new Set<number>(), draft: null }
// Without a layout the drawing is taken to be 800 px wide, its corner at 0, 0.
const frame = foldFrame({ points, settings: many.settings, narrow: false, width: 800, shown: null })
const markOfFeature = () => {
  const mark = markOf(frame, points, onRatios)
  return { clientX: mark?.x, clientY: mark?.y }
}
const mount = (more: Partial<typeof props> = {}) => mountSuspended(FoldPlot, { props: { ...props, ...more } })
type Plot = Awaited<ReturnType<typeof mount>>
const surface = (plot: Plot) => plot.get('svg').element.parentElement as HTMLElement
const send = (to: EventTarget, type: string, init: MouseEventInit = {}) => to.dispatchEvent(new MouseEvent(type, { bubbles: true, button: 0, ...init }))
const choose = (plot: Plot, label: string) => plot.findAll('button').find(button => button.text() === label)?.trigger('click')
const drag = async (plot: Plot, ...places: [number, number][]) => {
  const [first, ...others] = places.map(([clientX, clientY]) => ({ clientX, clientY }))
  send(surface(plot), 'pointerdown', first)
  for (const place of others) send(surface(plot), 'pointermove', place)
  await plot.vm.$nextTick()
}
const inPlot = (x: number, y: number): [number, number] => {
  const { left, top, width, height } = frame.panes.ratios
  return [left + x * width, top + y * height]
}
beforeEach(() => useBenchStore().show(initialView()))

describe('the fold-change plot', () => {
  it('tells the mark under the pointer, and picks it by a click', async () => {
    const plot = await mount()
    send(surface(plot), 'pointermove', markOfFeature())
    await plot.vm.$nextTick()
    expect(plot.text()).toContain('m/z')
    send(surface(plot), 'click', markOfFeature())
    expect(useBenchStore().selected).toBe(onRatios)
  })

  it('takes a second feature beside it with Ctrl', async () => {
    const plot = await mount()
    useBenchStore().select(onRatios === 0 ? 1 : 0)
    send(surface(plot), 'click', { ...markOfFeature(), ctrlKey: true })
    expect(useBenchStore().picked).toEqual([onRatios])
  })

  it('filters by a dragged rectangle, and lets it go', async () => {
    const plot = await mount()
    await choose(plot, 'Rectangle')
    await drag(plot, inPlot(0.6, 0.2), inPlot(0.9, 0.7))
    send(surface(plot), 'pointerup')
    expect(useBenchStore().area?.pane).toBe('certainty')
    expect(useBenchStore().area?.corners).toHaveLength(4)
    expect(useBenchStore().isFiltered).toBe(true)
    await plot.vm.$nextTick()
    await choose(plot, 'Drop the area')
    expect(useBenchStore().area).toBeNull()
  })

  it('filters by a lasso', async () => {
    const plot = await mount()
    await choose(plot, 'Lasso')
    await drag(plot, inPlot(0.5, 0.5), inPlot(0.7, 0.5), inPlot(0.7, 0.8), inPlot(0.6, 0.9))
    send(surface(plot), 'pointerup')
    expect(useBenchStore().area?.corners).toHaveLength(4)
  })

  it('gives a drag up on Esc', async () => {
    const plot = await mount()
    await choose(plot, 'Rectangle')
    await drag(plot, inPlot(0.6, 0.2), inPlot(0.9, 0.7))
    const escape = new KeyboardEvent('keydown', { key: 'Escape', cancelable: true })
    window.dispatchEvent(escape)
    expect(escape.defaultPrevented).toBe(true)
    send(surface(plot), 'pointerup')
    expect(useBenchStore().area).toBeNull()
  })

  it('zooms to a dragged part, by buttons, and back to the whole', async () => {
    const plot = await mount()
    await choose(plot, 'Zoom')
    await drag(plot, inPlot(0.25, 0.25), inPlot(0.75, 0.75))
    send(surface(plot), 'pointerup')
    const { x } = frame.panes.ratios
    expect(useBenchStore().foldWindow?.x[0]).toBeCloseTo(x[0] / 2, 1)
    await plot.vm.$nextTick()
    await plot.get('[aria-label=Further]').trigger('click')
    expect(useBenchStore().foldWindow).toBeNull()
    await plot.get('[aria-label=Nearer]').trigger('click')
    await choose(plot, 'Whole plot')
    expect(useBenchStore().foldWindow).toBeNull()
  })

  it('chooses an area by numbers', async () => {
    const plot = await mount()
    await choose(plot, 'Area by numbers')
    const form = plot.get('form')
    for (const [at, value] of ['1', '3', '0', '4'].entries()) await form.findAll('input')[at]?.setValue(value)
    await form.trigger('submit')
    expect(useBenchStore().area).toEqual({ pane: 'certainty', corners: [[1, 0], [3, 0], [3, 4], [1, 4]] })
  })

  it('moves limits by keys, with words for each', async () => {
    const plot = await mount()
    const [reachA, foldA, alpha] = plot.findAll('[role=slider]')
    expect(foldA?.attributes('aria-valuetext')).toBe('×2 more in Millrace')
    await foldA?.trigger('keydown', { key: 'ArrowLeft' })
    await alpha?.trigger('keydown', { key: 'ArrowUp' })
    await reachA?.trigger('keydown', { key: 'PageUp' })
    const drafts = plot.emitted('update:draft')?.map(([draft]) => draft as typeof many.settings)
    expect(2 ** (drafts?.[0]?.foldLimit ?? 0)).toBeCloseTo(2.1)
    expect(drafts?.[1]?.alpha).toBe(0.04)
    expect(drafts?.[2]?.reachLimit).toBe(4)
  })

  it('drags a limit, and Esc puts it back', async () => {
    const plot = await mount()
    const handle = plot.findAll('[role=slider]')[3]
    const [clientX, clientY] = inPlot(0.95, 0)
    send(handle?.element as Element, 'pointerdown')
    send(handle?.element as Element, 'pointermove', { clientX, clientY })
    const [moved] = plot.emitted('update:draft')?.at(-1) ?? []
    expect((moved as typeof many.settings).foldLimit).toBeGreaterThan(many.settings.foldLimit)
    await handle?.trigger('keydown', { key: 'Escape' })
    expect(plot.emitted('update:draft')?.at(-1)).toEqual([null])
  })

  it('has typed limits beside it, and neither them nor handles where none can be tried', async () => {
    const plot = await mount()
    const label = plot.findAll('label').find(each => each.text() === 'Reach limit')
    await plot.get(`[id="${label?.attributes('for')}"]`).setValue('10')
    expect(plot.emitted('update:draft')?.at(-1)).toEqual([{ ...many.settings, reachLimit: 10 }])
    const still = await mount({ mayPreview: false })
    expect(still.find('[role=slider]').exists()).toBe(false)
    expect(still.text()).not.toContain('Reach limit')
  })

  it('says the interval of the selected feature', async () => {
    useBenchStore().select(onRatios)
    const plot = await mount()
    expect(plot.text()).toContain('The bar is the 95 % interval of the selected feature')
  })
})
