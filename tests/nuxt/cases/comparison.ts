import { expect } from 'vitest'
import BalanceStrip from '~/components/comparison/BalanceStrip.vue'
import ComparisonCautions from '~/components/comparison/ComparisonCautions.vue'
import ComparisonList from '~/components/comparison/ComparisonList.vue'
import DivertList from '~/components/comparison/DivertList.vue'
import NewComparisonForm from '~/components/comparison/NewComparisonForm.vue'
import PreviewNotice from '~/components/comparison/PreviewNotice.vue'
import SheetChanges from '~/components/comparison/SheetChanges.vue'
import SidePicker from '~/components/comparison/SidePicker.vue'
import StudyBench from '~/components/comparison/StudyBench.vue'
import VersionBar from '~/components/comparison/VersionBar.vue'
import { alignmentDefaults } from '#shared/science/alignment/settings'
import { packComparisonData } from '#shared/formats/comparisonData'
import { packSampleTraces } from '#shared/formats/traceColumns'
import { packVerdicts } from '#shared/formats/verdictColumns'
import { sampleSchema } from '#shared/schemas/sample'
import type { AlignmentLine } from '#shared/types/alignment'
import type { SampleRow } from '#shared/types/sample'
import { benchRows } from './bench'
import { holds, type ComponentRows } from './componentCase'
import { inventedComparison, inventedComparisonLine, judged, sideNames } from './inventedComparison'
import { refusal } from './mountCase'

const counts = judged.result.counts
const sample = (name: string, side: 'A' | 'B' | null): SampleRow => ({ ...sampleSchema.parse({ name, side }), id: name, tables: 1, aligned: true, writtenBy: {} })
const samples = [sample('M1', 'A'), sample('T1', 'B')]
const alignment: AlignmentLine = { id: 'a1', number: 1, practice: false, asGiven: false, settings: alignmentDefaults, differs: [], groups: 14_000, tables: 6, comparisons: 0, createdByName: 'Eve Lark', createdAt: '2026-02-03T11:30:00.000Z' }
const LIST = '/api/studies/s1/comparisons'
const toCompare = { '/api/studies/s1/alignments': { alignments: [alignment, { ...alignment, id: 'a2', number: 2, practice: true }], ready: { tables: [], withoutSample: [], problem: null }, jobs: [] }, '/api/studies/s1/samples': { samples } }
const job = { id: 'j1', kind: 'compare', progress: 1, message: '' }
const inBench = { studyId: 's1', address: `${LIST}/c1`, saving: false, problem: '' }
const benchAnswers = {
  [`${LIST}/c1/data`]: packVerdicts(judged.result), [`${LIST}/c1/input`]: packComparisonData(judged.input), [`${LIST}/c1/traces`]: packSampleTraces([]),
  '/api/studies/s1/alignments/a1/flags': { flags: [{ id: 'f1', featureIndex: 4, kind: 'artefact', reason: 'odd', by: 'Eve Lark', at: '2026-02-03T11:30:00.000Z' }], mayFlag: true },
}

export const comparisonRows: ComponentRows = {
  ...benchRows,
  'comparison/BalanceStrip': [
    holds(BalanceStrip, 'says the one-sided counts in words', { props: { counts, names: sideNames } }, ({ text }) => {
      expect(text()).toBe(`found only in Millrace ${counts.onlyA}, only in Tallow Lane ${counts.onlyB}`)
    }),
    holds(BalanceStrip, 'has no bar where there is nothing', { props: { counts: { inNeither: 0, onlyA: 0, onlyB: 0, moreA: 0, moreB: 0, level: 0, unsettled: 0, setAside: 0 }, names: sideNames } }, ({ text }) => {
      expect(text()).toBe('found only in Millrace 0, only in Tallow Lane 0')
    }),
  ],
  'comparison/ComparisonCautions': [
    holds(ComparisonCautions, 'lists them under their number', { props: { cautions: ['One preparation a side.', 'No blanks.'] } }, ({ find }) => {
      expect(find('h3').text()).toBe('2 cautions')
      expect(document.querySelectorAll('li')).toHaveLength(2)
    }),
    holds(ComparisonCautions, 'is silent where there is none', { props: { cautions: [] } }, ({ text }) => expect(text()).toBe('')),
  ],
  'comparison/ComparisonList': [
    holds(ComparisonList, 'leads to each comparison', { props: { studyId: 's1', comparisons: [inventedComparisonLine, { ...inventedComparisonLine, id: 'c2', title: 'My try', practice: true, versions: 1 }] } }, ({ control, text }) => {
      expect(control('My try').attributes('href')).toBe('/studies/s1/comparisons/c2')
      expect(text()).toContain('2 versions · alignment 1 · Eve Lark, 3 Feb 2026')
      expect(text()).toContain('practice, seen by you alone')
    }),
  ],
  'comparison/DivertList': [
    holds(DivertList, 'passes on whole windows only', { props: { modelValue: [{ startMinutes: 0, endMinutes: 0.7 }] } }, async ({ press, fill, emitted, text }) => {
      await press('Add a window')
      await fill('Window 2 from', '12')
      expect(emitted('update:modelValue')).toEqual([])
      await fill('Window 1 from', '0.9')
      expect(text()).toContain('The end must lie after the start.')
      expect(emitted('update:modelValue')).toEqual([[[]]])
      await press('Remove window 2')
      await press('Remove window 1')
      expect(document.querySelectorAll('input')).toHaveLength(0)
    }),
  ],
  'comparison/NewComparisonForm': [
    holds(NewComparisonForm, 'compares as the sample sheet says, and opens what was made', { props: { alignmentId: null }, answers: { ...toCompare, [`POST ${LIST}`]: { jobId: 'j1' }, '/api/jobs/j1': { ...job, status: 'done', resultId: 'c9' } } }, async ({ send, asked, went, refreshed, text, until }) => {
      expect(text()).toContain('Compare Millrace with Tallow Lane')
      await send()
      await until(() => expect(went).toEqual(['/studies/s1/comparisons/c9']))
      expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ alignmentId: 'a1', title: '', practice: false, sides: {} })
      expect(refreshed()).toBe(1)
    }),
    holds(NewComparisonForm, 'takes sides by hand, and on a practice alignment practises only', { props: { alignmentId: 'a2' }, answers: { ...toCompare, [`POST ${LIST}`]: refusal('Each side needs a sample.', 'title') } }, async ({ fill, send, text, asked, control, until }) => {
      expect(text()).toContain('This will be a practice copy')
      await fill('by hand, for this comparison only', true)
      document.querySelectorAll<HTMLInputElement>('input[name=side-T1]')[2]?.click()
      await send()
      await until(() => expect(control('Title').attributes('aria-invalid')).toBe('true'))
      expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ alignmentId: 'a2', title: '', practice: true, sides: { T1: null } })
    }),
    holds(NewComparisonForm, 'says why the run failed', { props: { alignmentId: null }, answers: { ...toCompare, [`POST ${LIST}`]: { jobId: 'j1' }, '/api/jobs/j1': { ...job, status: 'failed', message: 'No sample is left.', resultId: null } } }, async ({ send, find, press, emitted, until }) => {
      await send()
      await until(() => expect(find('[role=alert]').text()).toContain('No sample is left.'))
      await press('Cancel')
      expect(emitted('cancel')).toHaveLength(1)
    }),
  ],
  'comparison/PreviewNotice': [
    holds(PreviewNotice, 'says what moved', { props: { before: counts, after: { ...counts, onlyA: counts.onlyA + 3 }, names: sideNames, foldLimit: 1 } }, ({ text }) => {
      expect(text()).toContain(`Preview, not saved. Against the saved version: found only in Millrace ${counts.onlyA} → ${counts.onlyA + 3}.`)
    }),
    holds(PreviewNotice, 'says that nothing moves', { props: { before: counts, after: counts, names: sideNames, foldLimit: 1 } }, ({ text }) => expect(text()).toContain('No verdict count moves')),
  ],
  'comparison/SheetChanges': [
    holds(SheetChanges, 'says what the sheet says otherwise, and saves anew', { props: { changes: ['M1: amount 100 mg before, 90 now.'], maySave: true, busy: false } }, async ({ text, press, emitted }) => {
      expect(text()).toContain('M1: amount 100 mg before, 90 now.')
      await press('Save a new version from the sheet as it is now')
      expect(emitted('renew')).toHaveLength(1)
    }),
    holds(SheetChanges, 'only tells those who may not save', { props: { changes: ['x'], maySave: false, busy: false } }, () => expect(document.querySelector('button')).toBeNull()),
  ],
  'comparison/SidePicker': [
    holds(SidePicker, 'begins as the sheet has it, and keeps what was chosen', { props: { samples, names: sideNames, modelValue: {} } }, async ({ emitted }) => {
      const [, toB] = document.querySelectorAll<HTMLInputElement>('input[name=side-M1]')
      expect([...document.querySelectorAll('input')].map(each => each.checked)).toEqual([true, false, false, false, true, false])
      toB?.click()
      expect(emitted('update:modelValue')).toEqual([[{ M1: 'B' }]])
    }),
    holds(SidePicker, 'says that there is nobody to choose', { props: { samples: [], names: sideNames, modelValue: {} } }, ({ text }) => expect(text()).toContain('no samples yet')),
  ],
  'comparison/StudyBench': [
    holds(StudyBench, 'shows verdicts, flags and an export, and flags what is selected', { props: { ...inBench, comparison: inventedComparison }, answers: benchAnswers }, async ({ find, control, text, until }) => {
      await until(() => expect(find('[role=grid]').attributes('aria-rowcount')).toMatch(/^\d{2,}$/))
      expect(control('Verdicts as CSV').attributes('href')).toBe('/api/studies/s1/comparisons/c1/verdicts.csv?version=2')
      useBenchStore().select(4)
      await until(() => expect(text()).toContain('artefact: odd'))
    }),
    holds(StudyBench, 'lets those who may not export take nothing along', { props: { ...inBench, comparison: inventedComparison }, roles: ['student'], answers: benchAnswers }, ({ has }) => expect(has('Verdicts as CSV')).toBe(false)),
  ],
  'comparison/VersionBar': [
    holds(VersionBar, 'leads to other versions and shares this one', { props: { comparison: inventedComparison, studyId: 's1', mayShare: true } }, async ({ control, fill, emitted, text, has }) => {
      expect(text()).toContain('Against version 1: Reach limit: ×5 before, ×3 now.')
      expect(control('What changed').attributes('href')).toBe('/studies/s1/comparisons/c1/changes?version=2')
      expect([has('Share'), has('Delete this practice copy')]).toEqual([true, false])
      await fill('Version', 'Version 1, Eve Lark')
      expect(emitted('pick')).toEqual([[1]])
    }),
    holds(VersionBar, 'says that an earlier version is open', { props: { comparison: { ...inventedComparison, practice: true, version: { ...inventedComparison.version, number: 1, differs: [] } }, studyId: 's1', mayShare: false } }, async ({ press, emitted, has }) => {
      await press('Go to version 2')
      expect(emitted('pick')).toEqual([[2]])
      expect([has('Share'), has('Delete this practice copy')]).toEqual([false, true])
    }),
  ],
}
