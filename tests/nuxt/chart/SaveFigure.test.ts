import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h } from 'vue'
import SaveFigure from '~/components/chart/SaveFigure.vue'
import { provideFigures } from '~/composables/useFigures'
import type { Figure, FigureContext } from '~/charts/figure/figure'

const context: FigureContext = { file: ['Juices', 'v1'], sides: ['A Millrace'], settings: ['Reach limit: ×3'], filter: '', origin: 'Juices', engineVersion: '4', cautions: [] }
const figure: Figure = { name: 'abundance', drawing: width => ({ width, height: 20, shapes: [{ kind: 'text', x: 0, y: 10, text: '<b>', ink: 'ink' }] }) }

/** The buttons on a page that offers figures, or does not. */
const onPage = (offered: FigureContext | null, shown: Figure = figure) => mountSuspended(defineComponent({
  setup() {
    provideFigures(() => offered)
    return () => h(SaveFigure, { figure: shown, title: 'Abundance', description: 'Told.' })
  },
}))
afterEach(() => vi.restoreAllMocks())

describe('saving a figure', () => {
  it('is not offered where nobody says what to write under it', async () => {
    expect((await onPage(null)).find('button').exists()).toBe(false)
    const alone = await mountSuspended(SaveFigure, { props: { figure, title: 'Abundance', description: '' } })
    expect(alone.find('button').exists()).toBe(false)
  })

  it('hands over an SVG file with its caption, escaped, and asks no server', async () => {
    const asked = vi.spyOn(globalThis, 'fetch')
    const files: Blob[] = []
    vi.spyOn(URL, 'createObjectURL').mockImplementation((file) => {
      if (file instanceof Blob) files.push(file)
      return 'blob:x'
    })
    const clicked = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => undefined)
    const page = await onPage(context)
    await page.get('button').trigger('click')
    await vi.waitFor(() => expect(clicked).toHaveBeenCalledTimes(1), { timeout: 30_000 })
    expect(clicked.mock.contexts[0]).toMatchObject({ download: 'abundance_juices_v1.svg' })
    const text = await files[0]?.text() ?? ''
    expect(text).toContain('&lt;b&gt;')
    expect(text).toContain('Reach limit: ×3')
    expect(asked).not.toHaveBeenCalled()
  })

  it('says so where it could not be made', async () => {
    const page = await onPage(context, { name: 'nothing' })
    await page.get('button').trigger('click')
    await vi.waitFor(() => expect(page.get('[role=status]').text()).toContain('could not be made'), { timeout: 30_000 })
  })
})
