import { expect } from 'vitest'
import ChangedFeatures from '~/components/practice/ChangedFeatures.vue'
import PracticeCompare from '~/components/practice/PracticeCompare.vue'
import PracticeDelete from '~/components/practice/PracticeDelete.vue'
import PracticeMark from '~/components/practice/PracticeMark.vue'
import ToleranceWord from '~/components/practice/ToleranceWord.vue'
import VerdictCounts from '~/components/practice/VerdictCounts.vue'
import WhatChanged from '~/components/practice/WhatChanged.vue'
import type { Verdict } from '#shared/science/verdict/verdicts'
import type { ChangedFeature, VersionChanges } from '#shared/types/comparison'
import { holds, type ComponentRows } from './componentCase'
import { inventedComparison, inventedComparisonLine, inventedVersionLine, judged, sideNames } from './inventedComparison'
import { refusal } from './mountCase'

const feature = (index: number): ChangedFeature => ({ index, indexBefore: index, mz: 200.5 + index, retentionMinutes: 4.2, highestCounts: 1e6, from: 'onlyA', to: 'unsettled', reasonFrom: 0, reasonTo: 0 })
const side = { comparisonId: 'c1', title: 'Two mills', alignmentNumber: 1, counts: judged.result.counts }
const changes: VersionChanges = {
  before: { ...side, number: 1, counts: { ...side.counts, onlyA: side.counts.onlyA + 4 } }, after: { ...side, number: 2 }, differs: ['Reach limit: ×3 before, ×5 now.'], matched: 50, onlyBefore: 1, onlyAfter: 2,
  moves: [{ from: 'level', to: 'level', count: 40 }, { from: 'onlyA', to: 'unsettled', count: 4 }], features: [feature(7)], changed: 1,
}
const nameOf = (verdict: Verdict) => `verdict ${verdict}`
const linkOf = (index: number) => `/studies/s1/comparisons/c1?feature=${index + 1}`
const LIST = '/api/studies/s1/comparisons'
const practised = { ...inventedComparisonLine, id: 'c2', title: 'Practice: two mills', practice: true, latest: { ...inventedVersionLine, alignmentId: 'a9' } }
const job = { id: 'j1', kind: 'compare', progress: 1, message: '' }

export const practiceRows: ComponentRows = {
  'practice/ChangedFeatures': [
    holds(ChangedFeatures, 'shows the first hundred, the rest on wish', { props: { changes: { ...changes, features: Array.from({ length: 103 }, (_, i) => feature(i)), changed: 140 }, nameOf, linkOf } }, async ({ control, press, text }) => {
      expect(document.querySelectorAll('tbody tr')).toHaveLength(100)
      expect(control('207.5000').attributes('href')).toBe('/studies/s1/comparisons/c1?feature=8')
      expect(text()).toContain('The 103 most intense of 140.')
      await press('Show 3 more')
      expect(document.querySelectorAll('tbody tr')).toHaveLength(103)
    }),
  ],
  'practice/PracticeCompare': [
    holds(PracticeCompare, 'compares as the official one, and goes on to what changed', {
      props: { alignmentId: 'a9' },
      answers: { [LIST]: [inventedComparisonLine, practised], [`${LIST}/c1`]: inventedComparison, [`POST ${LIST}`]: { jobId: 'j1' }, '/api/jobs/j1': { ...job, status: 'done', resultId: 'c3' } },
    }, async ({ control, send, asked, went, until }) => {
      expect(control('Practice: two mills').attributes('href')).toBe('/studies/s1/comparisons/c2')
      await send()
      await until(() => expect(went).toEqual(['/studies/s1/comparisons/c3/changes?against=2&againstComparison=c1']))
      expect(asked.find(({ method }) => method === 'POST')?.body).toMatchObject({ alignmentId: 'a9', practice: true, title: 'Practice: Millrace against Tallow Lane', sideAName: 'Millrace' })
    }),
    holds(PracticeCompare, 'says why the run failed', { props: { alignmentId: 'a9' }, answers: { [LIST]: [inventedComparisonLine], [`${LIST}/c1`]: inventedComparison, [`POST ${LIST}`]: { jobId: 'j1' }, '/api/jobs/j1': { ...job, status: 'failed', message: 'No table is left.', resultId: null } } }, async ({ send, find, until }) => {
      await send()
      await until(() => expect(find('[role=alert]').text()).toContain('No table is left.'))
    }),
    holds(PracticeCompare, 'has nothing to offer where there is no official one', { props: { alignmentId: 'a9' }, answers: { [LIST]: [] } }, ({ text }) => {
      expect(text()).toContain('There is no official comparison')
      expect(document.querySelector('form')).toBeNull()
    }),
  ],
  'practice/PracticeDelete': [
    holds(PracticeDelete, 'deletes after asking and goes to the list', { props: { comparisonId: 'c2' }, answers: { [`DELETE ${LIST}/c2`]: {} } }, async ({ press, went, refreshed, until }) => {
      await press('Delete this practice copy')
      await press('Delete it')
      await until(() => expect(went).toEqual(['/studies/s1/comparisons']))
      expect(refreshed()).toBe(1)
    }),
    holds(PracticeDelete, 'says why it stays', { props: { comparisonId: 'c2' }, answers: { [`DELETE ${LIST}/c2`]: refusal('This one is official.') } }, async ({ press, find, until }) => {
      await press('Delete this practice copy')
      await press('Delete it')
      await until(() => expect(find('[role=alert]').text()).toContain('This one is official.'))
    }),
  ],
  'practice/PracticeMark': [holds(PracticeMark, 'says who sees it', {}, ({ text }) => expect(text()).toBe('practice, seen by you alone'))],
  'practice/ToleranceWord': [
    holds(ToleranceWord, 'warns of findings that tolerances make', {}, ({ find }) => expect(find('[role=note]').text()).toContain('More one-sided features after a tighter run are no finding')),
  ],
  'practice/VerdictCounts': [
    holds(VerdictCounts, 'shows before, after and the difference, signed', { props: { before: changes.before.counts, after: changes.after.counts, nameOf } }, ({ text }) => {
      expect(text()).toContain(`verdict onlyA${side.counts.onlyA + 4}${side.counts.onlyA}−4`)
      expect(document.querySelectorAll('tbody tr')).toHaveLength(7)
    }),
  ],
  'practice/WhatChanged': [
    holds(WhatChanged, 'says what was set otherwise, what moved, and leads to each feature', { props: { changes, names: sideNames, foldLimit: 1, studyId: 's1' } }, ({ text, control }) => {
      expect(text()).toContain('Reach limit: ×3 before, ×5 now.')
      expect(text()).toContain('50 features held in both; 1 feature of before went or merged; 2 features are new or split off.')
      expect(text()).toContain('4 features: found only in Millrace → unsettled')
      expect(control('207.5000').attributes('href')).toBe('/studies/s1/comparisons/c1?version=2&feature=8')
    }),
    holds(WhatChanged, 'says that nothing changed', { props: { changes: { ...changes, differs: [], features: [], moves: [], changed: 0 }, names: sideNames, foldLimit: 1, studyId: 's1' } }, ({ text }) => {
      expect(text()).toContain('Nothing: settings, samples and alignment are the same.')
      expect(text()).toContain('0 features have another verdict')
    }),
  ],
}
