import { expect } from 'vitest'
import AreaByNumbers from '~/components/comparison/AreaByNumbers.vue'
import DrawnArea from '~/components/comparison/DrawnArea.vue'
import FoldLimits from '~/components/comparison/FoldLimits.vue'
import FoldOverlay from '~/components/comparison/FoldOverlay.vue'
import FoldTools from '~/components/comparison/FoldTools.vue'
import LimitHandle from '~/components/comparison/LimitHandle.vue'
import { foldFrame } from '~/charts/foldFrame'
import { placesOf } from '~/charts/foldPoints'
import { limitHandles } from '~/charts/limitHandles'
import { rectangleArea } from '~/utils/plotArea'
import { holds, type ComponentRows } from './componentCase'
import { judged, sideNames } from './inventedComparison'

const { result, settings } = judged
const points = placesOf(result.columns)
const frame = foldFrame({ points, settings, narrow: false, width: 800, shown: null })
const [limit] = limitHandles(settings, points.kind, sideNames)
if (!limit) throw new Error('no limit has a handle')
const rows = Int32Array.from({ length: 60 }, (_, i) => i)
const overlay = { frame, points, rows, result, settings, asked: settings, mayMove: true, names: sideNames, mode: 'pick' as const }

export const foldPlotRows: ComponentRows = {
  'comparison/AreaByNumbers': [
    holds(AreaByNumbers, 'takes an area by four numbers, in the place that is meant', { props: { frame, kind: points.kind, names: sideNames, area: null } }, async ({ fill, send, emitted, text, press }) => {
      await fill('log2 ratio, from', '')
      await send()
      expect(text()).toContain('Fill in all four numbers.')
      expect(emitted('choose')).toEqual([])
      await fill('Where', 'lane of Millrace')
      await send()
      expect(emitted('choose')[0]?.[0]).toMatchObject({ pane: 'laneA' })
      await press('Close')
      expect(emitted('close')).toHaveLength(1)
    }),
  ],
  'comparison/DrawnArea': [
    holds(DrawnArea, 'stands while an area does, and drops it', { props: { features: 1 } }, async ({ text, press, until }) => {
      expect(text()).toBe('')
      useBenchStore().area = rectangleArea('certainty', [0, 1], [0, 2])
      await until(() => expect(text()).toContain('Inside the area drawn, 1 feature.'))
      await press('Drop the area')
      expect(useBenchStore().area).toBeNull()
    }),
  ],
  'comparison/FoldLimits': [
    holds(FoldLimits, 'passes on a limit in its own unit, and says the range of a wrong one', { props: { asked: settings, kind: 'certainty' } }, async ({ fill, emitted, text }) => {
      await fill('Fold limit', '4')
      expect(emitted('change')).toEqual([[{ foldLimit: 2 }]])
      await fill('Alpha', '7')
      expect(emitted('change')).toHaveLength(1)
      expect(text()).toContain('From 0.000001 to 0.5.')
    }),
    holds(FoldLimits, 'has no alpha where nothing is tested', { props: { asked: settings, kind: 'abundance' } }, ({ has }) => expect([has('Fold limit'), has('Alpha')]).toEqual([true, false])),
  ],
  'comparison/FoldOverlay': [
    holds(FoldOverlay, 'rings what is selected and picked, and moves a limit by keys', { props: overlay }, async ({ control, emitted, until }) => {
      const placed = rows.find(feature => Number.isFinite(result.columns.log2Ratio[feature])) ?? 0
      useBenchStore().select(placed)
      await until(() => expect(document.querySelectorAll('circle[r="9"]')).toHaveLength(1))
      await control(limit.label).trigger('keydown', { key: 'ArrowRight' })
      expect(emitted('limits')).toHaveLength(1)
    }),
    holds(FoldOverlay, 'has no handles where limits can\'t be tried', { props: { ...overlay, mayMove: false } }, () => expect(document.querySelector('button')).toBeNull()),
  ],
  'comparison/FoldTools': [
    holds(FoldTools, 'says what a drag does, and shows the whole or a part', { props: { isWhole: true, mode: 'pick', byNumbers: false } }, async ({ control, press, emitted, change }) => {
      expect(control('Pick').attributes('aria-pressed')).toBe('true')
      expect(control('Whole plot').attributes('disabled')).toBe('')
      await press('Lasso')
      await press('Nearer')
      await press('Area by numbers')
      expect([emitted('update:mode'), emitted('nearer').length, emitted('update:byNumbers')]).toEqual([[['lasso']], 1, [[true]]])
      await change({ isWhole: false, byNumbers: true })
      expect(control('Area by numbers').attributes('aria-expanded')).toBe('true')
      await press('Whole plot')
      expect(emitted('whole')).toHaveLength(1)
    }),
  ],
  'comparison/LimitHandle': [
    holds(LimitHandle, 'is a slider with words, moved by keys', { props: { limit, pane: frame.panes[limit.pane] } }, async ({ control, emitted }) => {
      const handle = control(limit.label)
      expect(handle.attributes()).toMatchObject({ 'role': 'slider', 'aria-valuetext': limit.says, 'aria-valuenow': String(limit.at) })
      for (const key of ['ArrowUp', 'PageDown', 'q']) await handle.trigger('keydown', { key })
      expect(emitted('step')).toEqual([[1], [-10]])
    }),
  ],
}
