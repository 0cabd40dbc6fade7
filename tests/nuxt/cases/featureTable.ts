import { expect } from 'vitest'
import FeatureHead from '~/components/comparison/FeatureHead.vue'
import FeatureRow from '~/components/comparison/FeatureRow.vue'
import FeatureSection from '~/components/comparison/FeatureSection.vue'
import { featureColumns } from '~/utils/featureColumns'
import { holds, type ComponentRows } from './componentCase'
import { inventedSource, inventedVersion, judged, sideNames } from './inventedComparison'

const { result, settings } = judged
const columns = featureColumns({ result, foldLimit: 1, names: sideNames, masses: inventedVersion, flags: new Map(), asked: [] })
const rows = Int32Array.of(4, 9, 17)
const section = { source: inventedSource, capabilities: { save: false, csvAddress: '/verdicts.csv' }, result, isPreview: false, rows, total: 60, selectedRow: -1, settings, names: sideNames, flags: new Map(), cautions: [] }

export const featureTableRows: ComponentRows = {
  'comparison/ColumnChoice': { test: 'tests/nuxt/comparison/featureTable.test.ts' },
  'comparison/ColumnMenu': { test: 'tests/nuxt/comparison/featureTable.test.ts' },
  'comparison/FeatureHead': [
    holds(FeatureHead, 'names every column and its menu, and says how it is sorted', { props: { columns, active: -1, id: 'grid', styles: [], classes: [] } }, async ({ control, press, emitted, find }) => {
      expect(document.querySelectorAll('[role=columnheader]')).toHaveLength(columns.length)
      expect(find('[aria-sort]').attributes('aria-sort')).toBe('descending')
      await press('m/z')
      await press(control(/^Menu of m\/z/).attributes('aria-label') ?? '')
      const place = columns.findIndex(({ id }) => id === 'mz')
      expect([emitted('press'), emitted('menu')[0]?.[0]]).toEqual([[[place, false]], place])
    }),
  ],
  'comparison/FeatureRow': [
    holds(FeatureRow, 'says whether it is picked and where it stands, is pressed, and tells full values on hover', {
      props: { index: 3, feature: 4, verdict: result.columns.verdict[4] ?? 0, top: 84, height: 28, state: 'picked', isCursor: true, columns, frozen: 0, styles: [], classes: [], flags: undefined, names: sideNames },
    }, async ({ find, emitted, change, until }) => {
      const row = find('[role=row]')
      expect(row.attributes()).toMatchObject({ 'aria-rowindex': '5', 'aria-selected': 'true' })
      expect(row.classes()).toContain('outline-dashed')
      const cells = row.findAll('[role=gridcell]')
      const mz = cells[columns.findIndex(({ id }) => id === 'mz')]
      expect([cells.length, mz?.attributes('title')]).toEqual([columns.length, undefined])
      await row.trigger('mouseover')
      await until(() => expect(Number(mz?.attributes('title'))).toBe(result.columns.mz[4]))
      await row.trigger('click')
      expect(emitted('press')).toHaveLength(1)
      await change({ state: 'none', isCursor: false })
      await until(() => expect(row.attributes('aria-selected')).toBe('false'))
      expect(row.classes()).not.toContain('outline-dashed')
    }),
  ],
  'comparison/FeatureSection': [
    holds(FeatureSection, 'copies what is picked, and says what the filter left out', { props: section }, async ({ text, press, find, control, until }) => {
      expect(text()).toContain('3 of 60 features')
      await press('Copy the row')
      await until(() => expect(find('section > div > [role=status]').text()).toBe('Nothing to copy: select a row first.'))
      useBenchStore().select(4)
      useBenchStore().pick(9)
      useBenchStore().pick(30)
      const data = new Map<string, string>()
      const event = Object.assign(new Event('copy', { bubbles: true, cancelable: true }), { clipboardData: { setData: (type: string, value: string) => data.set(type, value) } })
      find('[role=grid]').element.dispatchEvent(event)
      await until(() => expect(find('section > div > [role=status]').text()).toBe('2 rows copied. 1 picked row is left out: the filter hides it.'))
      expect(data.get('text/plain')?.split('\n')).toHaveLength(3)
      await press('Pick several rows')
      expect(control('Pick several rows').attributes('aria-pressed')).toBe('true')
    }),
    holds(FeatureSection, 'says that no feature passes, and exports nothing for those who may not', { props: { ...section, rows: new Int32Array(0), capabilities: { save: false, csvAddress: null } } }, ({ text, has }) => {
      expect(text()).toContain('No feature passes this filter.')
      expect(has('Rows shown as CSV')).toBe(false)
    }),
    holds(FeatureSection, 'has its filters while the features are on their way', { props: { ...section, result: null, rows: new Int32Array(0) } }, ({ has }) => {
      expect([has('Find a feature'), has('Copy the row')]).toEqual([true, false])
    }),
  ],
  'comparison/FeatureTable': { test: 'tests/nuxt/comparison/featureTable.test.ts' },
}
