import { expect } from 'vitest'
import DrawingSvg from '~/components/chart/DrawingSvg.vue'
import DriftChart from '~/components/chart/DriftChart.vue'
import EchartsCanvas from '~/components/chart/EchartsCanvas.client.vue'
import GroupSizesChart from '~/components/chart/GroupSizesChart.vue'
import MarkRings from '~/components/chart/MarkRings.vue'
import MassErrorChart from '~/components/chart/MassErrorChart.vue'
import PlotHint from '~/components/chart/PlotHint.vue'
import { holds, type ComponentRows } from './componentCase'

export const chartRows: ComponentRows = {
  'chart/ChartFrame': { test: 'tests/nuxt/chart/ChartFrame.test.ts' },
  'chart/DrawingSvg': [
    holds(DrawingSvg, 'draws lines, marks and words, and tells of them under the pointer', {
      props: { drawing: { width: 200, height: 80, shapes: [{ kind: 'line', d: 'M0 0L200 80', ink: 'muted', says: 'the floor' }, { kind: 'mark', shape: 'circle', x: 10, y: 20, ink: 'sideA', says: 'M1' }, { kind: 'text', x: 5, y: 9, text: 'counts', ink: 'ink', turned: true }] } },
    }, ({ find }) => {
      expect(find('svg').attributes()).toMatchObject({ 'viewBox': '0 0 200 80', 'aria-hidden': 'true' })
      expect([...document.querySelectorAll('title')].map(each => each.textContent)).toEqual(['the floor', 'M1'])
      expect(find('svg text').attributes('transform')).toBe('rotate(-90 5 9)')
    }),
  ],
  'chart/DriftChart': [
    holds(DriftChart, 'tells the drift in words and as a table, and lets one table stand out', { props: { tables: [{ sampleName: 'M1', drift: [] }, { sampleName: 'M2', drift: [[1, 0.01], [5, -0.08]] }] } }, async ({ text, control, press, fill }) => {
      expect(text()).toContain('The times of 1 of 2 tables were corrected.')
      expect((control('Stands out in the drawing').element as HTMLSelectElement).selectedOptions[0]?.text).toBe('M2')
      await fill('Stands out in the drawing', 'M1')
      expect(text()).toContain('M1 was not corrected.')
      await press('Show as table')
      expect(control('Hide the table').attributes('aria-expanded')).toBe('true')
      expect(text()).toContain('M2−0.0805.00')
    }),
  ],
  'chart/EchartsCanvas.client': [
    holds(EchartsCanvas, 'draws the option it is given, and takes parts away that the next one lacks', { props: { option: { series: [] } } }, ({ part }) => {
      const drawing = part.findComponent({ name: 'VChart' })
      expect(drawing.props('option')).toEqual({ series: [] })
      expect(drawing.props('updateOptions')).toEqual({ replaceMerge: ['series', 'xAxis', 'yAxis', 'grid'] })
    }),
  ],
  'chart/GroupSizesChart': [
    holds(GroupSizesChart, 'tells how many features stand in how many tables', { props: { groupSizes: [12, 0, 1400] } }, async ({ press, text }) => {
      await press('Show as table')
      expect(text()).toContain('31 400')
    }),
  ],
  'chart/MarkRings': [
    holds(MarkRings, 'rings what is looked at and hovered over, each otherwise', { props: { selected: { x: 1, y: 2 }, picked: [{ x: 3, y: 4 }, { x: 5, y: 6 }], hovered: null } }, async ({ change, until }) => {
      const rings = () => [...document.querySelectorAll('circle')].map(ring => ['cx', 'cy', 'r'].map(name => Number(ring.getAttribute(name))))
      expect(rings()).toEqual([[3, 4, 7], [5, 6, 7], [1, 2, 9]])
      await change({ selected: null, picked: [], hovered: { x: 8, y: 9 } })
      await until(() => expect(rings()).toEqual([[8, 9, 6]]))
    }),
  ],
  'chart/PlotHint': [
    holds(PlotHint, 'stands on the side where there is room', { props: { x: 700, y: 40, width: 800, height: 400, lines: ['m/z 301.1', 'level'] } }, ({ text, find }) => {
      expect(text()).toBe('m/z 301.1level')
      expect(find('div[style]').attributes('style')).toMatch(/right: 112px; top: 52px/)
    }),
  ],
  'chart/SaveFigure': { test: 'tests/nuxt/chart/SaveFigure.test.ts' },
  'chart/MassErrorChart': [
    holds(MassErrorChart, 'tells offset and error of each table', { props: { tables: [{ sampleName: 'M1', offsetPpm: 2.36, offsetApplied: true, residualMedianPpm: 0.8 }, { sampleName: 'M2', offsetPpm: 0, offsetApplied: false, residualMedianPpm: null }] } }, async ({ press, text }) => {
      expect(text()).toContain('A mass offset was taken out of 1 table: M1 +2.4 ppm.')
      await press('Show as table')
      expect(text()).toContain('2 · M2')
      expect(text()).toContain('none shared')
    }),
  ],
}
