import { expect } from 'vitest'
import AbundancePlot from '~/components/comparison/AbundancePlot.vue'
import BenchFlags from '~/components/comparison/BenchFlags.vue'
import BenchKeysHelp from '~/components/comparison/BenchKeysHelp.vue'
import ComparisonBeam from '~/components/comparison/ComparisonBeam.vue'
import ComparisonBench from '~/components/comparison/ComparisonBench.vue'
import ComponentChoices from '~/components/comparison/ComponentChoices.vue'
import ComponentLoadings from '~/components/comparison/ComponentLoadings.vue'
import ComponentScores from '~/components/comparison/ComponentScores.vue'
import FeatureFilters from '~/components/comparison/FeatureFilters.vue'
import FeatureSheet from '~/components/comparison/FeatureSheet.vue'
import FormulaField from '~/components/comparison/FormulaField.vue'
import GroupMark from '~/components/comparison/GroupMark.vue'
import MassField from '~/components/comparison/MassField.vue'
import PrintHead from '~/components/comparison/PrintHead.vue'
import RangeField from '~/components/comparison/RangeField.vue'
import SampleValues from '~/components/comparison/SampleValues.vue'
import SampleValueTable from '~/components/comparison/SampleValueTable.vue'
import VerdictMark from '~/components/comparison/VerdictMark.vue'
import { sampleComponents } from '#shared/science/components/sampleComponents'
import { VERDICT } from '#shared/science/verdict/verdicts'
import { componentSamples } from '~/charts/componentSamples'
import { displayFactors, sampleValues } from '~/charts/sampleValues'
import { holds, type ComponentRows } from './componentCase'
import { featureTableRows } from './featureTable'
import { foldPlotRows } from './foldPlot'
import { inventedSource, inventedVersion, judged, sideNames } from './inventedComparison'

const { input, result, settings } = judged
const own = (test: string) => ({ test: `tests/nuxt/comparison/${test}.test.ts` })
const onlyA = result.columns.verdict.indexOf(VERDICT.onlyA)
const rows = Int32Array.from({ length: 60 }, (_, i) => i)
const values = sampleValues(input, displayFactors(input.samples, settings), settings, onlyA)
const all = componentSamples(input.samples, settings)
const part = all.filter(({ group }) => group === 'A' || group === 'B')
const found = sampleComponents({ intensity: part.map(({ index }) => input.intensity[index] ?? new Float64Array(60)), factors: part.map(({ factor }) => factor), features: rows, scaling: 'pareto', most: 5 })
const pair = { across: 1, upwards: 2 }

export const benchRows: ComponentRows = {
  ...featureTableRows,
  ...foldPlotRows,
  'comparison/AbundancePlot': [
    holds(AbundancePlot, 'draws a feature in every sample, and tells it in words', { props: { feature: onlyA, title: 'Abundance', data: input, settings, names: sideNames } }, async ({ text, press }) => {
      expect(text()).toContain('Tallow Lane: found in 0 of 3.')
      await press('Show as table')
      expect(document.querySelectorAll('tbody tr')).toHaveLength(input.samples.length)
    }),
  ],
  'comparison/AbundanceView': own('abundance'),
  'comparison/BalanceBar': own('benchParts'),
  'comparison/BenchFlags': [
    holds(BenchFlags, 'shows the flags of the feature', { props: { studyId: 's1', alignmentId: 'a1', featureIndex: 4, mayFlag: true }, answers: { '/api/studies/s1/alignments/a1/flags': { flags: [], mayFlag: true } } }, async ({ press, find, text }) => {
      expect(text()).toContain('No flag on this feature.')
      await press('Flag')
      expect(find('form').attributes('aria-label')).toBe('Set a flag')
    }),
  ],
  'comparison/BenchKeysHelp': [
    holds(BenchKeysHelp, 'lists the keys and what they do', { props: { keys: [{ key: 'ArrowDown', says: 'next feature', act: () => {} }], open: true } }, ({ find }) => {
      expect(find('[role=dialog]').text()).toContain('↓next feature')
    }),
  ],
  'comparison/BenchPlot': own('componentsPlot'),
  'comparison/ChromatogramBrush': own('MirroredChromatogram'),
  'comparison/ChromatogramControls': own('MirroredChromatogram'),
  'comparison/ChromatogramKey': own('MirroredChromatogram'),
  'comparison/ComparisonBeam': [
    holds(ComparisonBeam, 'says which way it leans, and who stands on the sides', { props: { counts: result.counts, names: sideNames, samples: [...input.samples] } }, ({ find, text }) => {
      expect(find('[role=img]').attributes('aria-label')).toMatch(/Millrace|Tallow Lane/)
      expect(text()).toContain('3 preparations')
    }),
  ],
  'comparison/ComparisonBench': [
    holds(ComparisonBench, 'loads what it shows, selects, and clears a filter that nothing passes', { props: { source: inventedSource, capabilities: { save: true, csvAddress: '/verdicts.csv' } } }, async ({ find, press, text, fill, until }) => {
      await until(() => expect(find('[role=grid]').attributes('aria-rowcount')).toMatch(/^\d{2,}$/))
      await find('[role=grid]').trigger('keydown', { key: 'ArrowDown' })
      await until(() => expect(text()).toMatch(/feature #\d+/))
      await fill('Find a feature', 'no such word')
      await until(() => expect(text()).toContain('No feature passes this filter.'))
      useBenchStore().clearFilter()
      await until(() => expect(text()).not.toContain('No feature passes this filter.'))
      await press('Keys of the bench (?)')
      expect(find('[role=dialog]').text()).toContain('next feature')
    }),
    holds(ComparisonBench, 'says why there is nothing to show', { props: { source: { ...inventedSource, loadVerdicts: () => Promise.reject(new Error('gone')) }, capabilities: { save: false, csvAddress: '/verdicts.csv' } } }, async ({ find, text, control, until }) => {
      await until(() => expect(find('[role=alert]').text()).toContain('Something went wrong on this page.'))
      expect(text()).toContain('Nothing to show.')
      expect(control('Verdicts as CSV').attributes('href')).toBe('/verdicts.csv')
    }),
  ],
  'comparison/ComponentChoices': [
    holds(ComponentChoices, 'chooses who takes part and what is drawn', { props: { samples: all, names: sideNames, explained: found } }, async ({ fill, has }) => {
      await fill(/^blanks \(2\)$/, true)
      expect(useBenchStore().componentGroups).toContain('blank')
      const first = all[0]
      await fill(new RegExp(`^${first?.name}$`), false)
      expect(useBenchStore().componentWithout).toEqual([first?.index])
      expect(has(/^Millrace/)).toBe(false)
      await fill('Across', (document.querySelectorAll('select')[0]?.options[1]?.text ?? '').trim())
      expect(useBenchStore().componentPair).toEqual({ across: 2, upwards: 1 })
    }),
  ],
  'comparison/ComponentLoadings': [
    holds(ComponentLoadings, 'names the farthest features, each to be selected', { props: { found, columns: result.columns, rows, sampleCount: part.length, pair, foldLimit: 1, names: sideNames, basis: 'log2 of 60 features.' } }, async ({ press }) => {
      await press('Show as table')
      const first = document.querySelector<HTMLElement>('tbody button')
      first?.click()
      await nextTick()
      expect(useBenchStore().selected).not.toBeNull()
      expect(first?.getAttribute('aria-pressed')).toBe('true')
    }),
  ],
  'comparison/ComponentScores': [
    holds(ComponentScores, 'gives each sample\'s scores as a table too', { props: { found, samples: part, pair, names: sideNames, narrow: true, basis: 'log2 of 60 features.' } }, async ({ press, text }) => {
      await press('Show as table')
      expect(document.querySelectorAll('tbody tr')).toHaveLength(6)
      expect(text()).toContain('M1Millrace')
    }),
  ],
  'comparison/ComponentsPlot': own('componentsPlot'),
  'comparison/FeatureCard': own('benchParts'),
  'comparison/FeatureFilters': [
    holds(FeatureFilters, 'searches, sets the tolerance, and says how many pass', { props: { shown: 12, total: 14_000, hasFlags: true, masses: inventedVersion, filters: [] } }, async ({ fill, press, text, has }) => {
      expect(text()).toContain('12 of 14 000 features')
      await fill('Find a feature', '301.1')
      await fill('m/z within', '0')
      await fill('Flags', 'contaminant')
      expect(useBenchStore()).toMatchObject({ find: '301.1', massPpm: 10, flags: 'contaminant' })
      await press('Clear the filter')
      expect([useBenchStore().find, has('Clear the filter')]).toEqual(['', false])
    }),
  ],
  'comparison/FeatureSheet': [
    holds(FeatureSheet, 'says what to do while nothing is selected', { props: { open: false }, slots: { default: () => 'card' } }, ({ text }) => expect(text()).toContain('Select a feature')),
    holds(FeatureSheet, 'holds the card', { props: { open: true }, slots: { default: () => 'card' } }, async ({ text, press, control, find }) => {
      expect(text()).toContain('card')
      await press('Put the card away')
      expect(control('Show the feature card').attributes('aria-expanded')).toBe('false')
      expect(find(`[id="${control('Show the feature card').attributes('aria-controls')}"]`).classes()).toContain('max-[899px]:hidden')
    }),
  ],
  'comparison/PrintHead': [
    holds(PrintHead, 'says where a printed page comes from, under which limits and filter', { props: { savedAt: '2026-02-03T11:30:00.000Z', context: { file: [], sides: ['A Millrace: 3 preparations'], settings: ['Reach limit: ×3'], filter: 'none', origin: 'Juices; version 2', engineVersion: '4', cautions: ['Screening indication only.', 'Few replicates.'] } } }, ({ text }) => {
      expect(text()).toMatch(/Juices; version 2.*Saved 3 Feb 2026. Printed \d+ \w+ \d{4}. Engine 4.*Reach limit: ×3.*Filter: none.*Screening/)
    }),
  ],
  'comparison/FilterChips': own('featureFilters'),
  'comparison/FilterPanel': own('featureFilters'),
  'comparison/FoldPlot': own('FoldPlot'),
  'comparison/FormulaField': [
    holds(FormulaField, 'takes a formula once it is whole, and says what is wrong with another', { props: { hint: 'never an identification', modelValue: null } }, async ({ fill, find, emitted, until }) => {
      await fill('of the molecule', 'C6H12O6')
      await find('fieldset').trigger('change')
      expect(emitted('update:modelValue').at(-1)).toEqual([{ formula: 'C6H12O6', ppm: 5 }])
      await fill('of the molecule', 'C6Zz')
      await find('fieldset').trigger('change')
      await until(() => expect(find('[role=alert]').text()).not.toBe(''))
    }),
  ],
  'comparison/GroupMark': [holds(GroupMark, 'is a mark without a word of its own', { props: { group: 'B' } }, ({ find }) => expect(find('svg').attributes('aria-hidden')).toBe('true'))],
  'comparison/LoadingsOverlay': own('componentsPlot'),
  'comparison/MassField': [
    holds(MassField, 'takes a mass with the usual tolerance, and lets it go', { props: { label: 'm/z', usualPpm: 10, modelValue: null } }, async ({ fill, find, emitted }) => {
      await fill('at', '301,1')
      await find('fieldset').trigger('change')
      expect(emitted('update:modelValue').at(-1)).toEqual([{ value: 301.1, ppm: 10 }])
      await fill('at', '')
      await find('fieldset').trigger('change')
      expect(emitted('update:modelValue').at(-1)).toEqual([null])
    }),
  ],
  'comparison/MirroredChromatogram': own('MirroredChromatogram'),
  'comparison/RangeField': [
    holds(RangeField, 'takes one end or both', { props: { label: 'Reach', unit: '×', modelValue: { from: null, to: null } } }, async ({ fill, find, emitted }) => {
      expect(find('legend').text()).toBe('Reach')
      await fill('from', '3')
      await find('fieldset').trigger('change')
      expect(emitted('update:modelValue').at(-1)).toEqual([{ from: 3, to: null }])
    }),
  ],
  'comparison/SampleValues': [
    holds(SampleValues, 'tells the values in words, and as a table on wish', { props: { values, names: sideNames, feature: 'm/z 301.1' } }, async ({ find, control, press }) => {
      expect(find('[role=img]').attributes('aria-label')).toContain('Tallow Lane: found in 0 of 3')
      await press('Show as table')
      expect(control('Hide the table').attributes('aria-expanded')).toBe('true')
      expect(document.querySelectorAll('tbody tr')).toHaveLength(values.length)
    }),
  ],
  'comparison/SampleValueTable': [
    holds(SampleValueTable, 'says where a feature was not found, and what a floor is', { props: { values, full: true } }, ({ text }) => {
      expect(text()).toContain('not found')
      expect(text()).toContain('stated')
      expect(document.querySelectorAll('thead th')).toHaveLength(8)
    }),
    holds(SampleValueTable, 'is short beside a card, with floors that are not known', { props: { values: values.map(value => ({ ...value, floor: Number.NaN })) } }, ({ text }) => {
      expect(document.querySelectorAll('thead th')).toHaveLength(4)
      expect(text()).toContain('–')
    }),
  ],
  'comparison/SettingsPanel': own('benchParts'),
  'comparison/TraceChanges': own('TraceChanges'),
  'comparison/VerdictMark': [
    holds(VerdictMark, 'has a shape of its own for each verdict', { props: { verdict: VERDICT.onlyB } }, async ({ find, change }) => {
      expect(find('svg rect').element).toBeTruthy()
      await change({ verdict: VERDICT.onlyA })
      expect(find('svg circle').attributes('fill')).toBe('currentColor')
      await change({ verdict: VERDICT.unsettled })
      expect(find('svg circle').attributes('fill')).toBeUndefined()
    }),
  ],
}
