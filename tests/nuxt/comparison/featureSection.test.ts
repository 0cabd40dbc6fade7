import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import FeatureSection from '~/components/comparison/FeatureSection.vue'
import type { BenchSource } from '~/utils/benchSource'
import { initialView } from '~/utils/benchView'
import { manyVerdicts } from '../../support/manyFeatures'

const many = manyVerdicts(300)
const rows = Int32Array.from({ length: 300 }, (_, i) => 299 - i)
const names = { a: 'Millrace', b: 'Tallow Lane' }
const source: BenchSource = {
  title: 'Apple juices',
  study: null,
  version: { number: 2, sideAName: 'Millrace', sideBName: 'Tallow Lane', counts: many.result.counts, settings: many.settings, samples: [], cautions: [], engineVersion: '7', polarity: 'negative', massKind: 'mz', alignMassPpm: 10, createdAt: '2026-02-03T11:30:00.000Z' },
  exportNotes: () => [],
  loadVerdicts: () => Promise.resolve(many.result),
  loadData: null,
  loadTraces: null,
  loadExtracted: null,
}
const mountSection = (csvAddress: string | null = '/verdicts.csv') => mountSuspended(FeatureSection, {
  props: { source, capabilities: { save: false, csvAddress }, result: many.result, isPreview: false, rows, total: 300, selectedRow: -1, settings: many.settings, names, flags: new Map(), cautions: ['Few replicates.'] },
})
const copy = async (section: Awaited<ReturnType<typeof mountSection>>) => {
  let text = ''
  const event = Object.assign(new Event('copy', { bubbles: true, cancelable: true }), { clipboardData: { setData: (_: string, data: string) => text = data } })
  section.get('[role=grid]').element.dispatchEvent(event)
  await nextTick()
  return { text, wasTaken: event.defaultPrevented }
}
beforeEach(() => useBenchStore().show(initialView()))

describe('rows of the feature table', () => {
  it('are copied as picked, in the order shown, and it is said', async () => {
    useBenchStore().pickAll([4, 9, 7])
    const section = await mountSection()
    const { text, wasTaken } = await copy(section)
    expect(wasTaken).toBe(true)
    expect(text.split('\n').slice(1).map(line => line.split('\t')[1])).toEqual(['10', '8', '5'])
    expect(section.text()).toContain('3 rows copied.')
  })

  it('are copied without those that the filter hides, and that is said', async () => {
    useBenchStore().pickAll([4, 9])
    const section = await mountSection()
    await section.setProps({ rows: rows.filter(feature => feature !== 9) })
    expect((await copy(section)).text.split('\n')).toHaveLength(2)
    expect(section.text()).toContain('1 row copied. 1 picked row is left out')
  })

  it('are not copied where none is selected: it says what to do', async () => {
    const section = await mountSection()
    await copy(section)
    expect(section.text()).toContain('select a row first')
  })

  it('are saved as CSV where the person may export, and only there', async () => {
    const made: Blob[] = []
    vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => {
      made.push(blob as Blob)
      return 'blob:made'
    })
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => {})
    const section = await mountSection()
    await section.findAll('button').find(button => button.text() === 'Rows shown as CSV')?.trigger('click')
    const lines = (await made[0]?.text() ?? '').split('\r\n')
    expect(lines[0]).toContain('300 of 300 features of “Apple juices”, version 2')
    expect(lines.some(line => line.includes('Caution: Few replicates.'))).toBe(true)
    expect(section.text()).toContain('300 rows saved as CSV.')
    const guest = await mountSection(null)
    expect(guest.text()).not.toContain('CSV')
  })

  it('gets a column for the ions of what is looked for', async () => {
    useBenchStore().formula = { formula: 'C21H24O10', ppm: 5 }
    const section = await mountSection()
    expect(section.get('[role=grid]').text()).toContain('m/z fits C21H24O10')
    expect(section.text()).toContain('not an identification')
  })
})
