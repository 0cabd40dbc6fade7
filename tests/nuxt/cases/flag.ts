import { expect } from 'vitest'
import FeatureFlags from '~/components/flag/FeatureFlags.vue'
import FlagForm from '~/components/flag/FlagForm.vue'
import FlaggedFeatureTable from '~/components/flag/FlaggedFeatureTable.vue'
import FlagList from '~/components/flag/FlagList.vue'
import FlagMany from '~/components/flag/FlagMany.vue'
import FlagMark from '~/components/flag/FlagMark.vue'
import FlagMarks from '~/components/flag/FlagMarks.vue'
import FlagUndo from '~/components/flag/FlagUndo.vue'
import type { FlaggedFeature, FlagLine } from '#shared/types/flag'
import { holds, type ComponentRows } from './componentCase'
import { refusal } from './mountCase'

const flag: FlagLine = { id: 'f1', featureIndex: 4, kind: 'contaminant', reason: 'plasticiser', by: 'Eve Lark', at: '2026-02-03T11:30:00.000Z' }
const ADDRESS = '/api/studies/s1/alignments/a1/flags'
const place = { studyId: 's1', alignmentId: 'a1' }
const flags = { flags: [flag], mayFlag: true }
const found: FlaggedFeature = {
  ...flag, alignmentId: 'a1', alignmentNumber: 1, practice: false, mz: 301.12345, retentionMinutes: 4.618,
  judged: { comparisonId: 'c1', title: 'Two mills', versionNumber: 2, sideAName: 'A', sideBName: 'B', verdict: 'onlyA', phrase: 'found only in Millrace' },
}

export const flagRows: ComponentRows = {
  'flag/FeatureFlags': [
    holds(FeatureFlags, 'shows what stands, flags, and takes back with undo', { props: { ...place, featureIndex: 4, mayFlag: true }, answers: { [ADDRESS]: flags, [`POST ${ADDRESS}`]: { flagIds: ['f2'] }, [`PATCH ${ADDRESS}`]: {} } }, async ({ text, press, fill, send, asked, until }) => {
      await until(() => expect(text()).toContain('plasticiser'))
      await press('Flag')
      expect(document.activeElement?.tagName).toBe('SELECT')
      await fill('Reason', 'seen in the blank')
      await send()
      await until(() => expect(text()).toContain('Flag set.'))
      expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ featureIndexes: [4], kind: 'ofInterest', reason: 'seen in the blank' })
      await press('Undo')
      await until(() => expect(asked.find(({ method }) => method === 'PATCH')?.body).toEqual({ flagIds: ['f2'], takenBack: true }))
      await until(() => expect(text()).toContain('Flag taken back.'))
    }),
    holds(FeatureFlags, 'only shows them to those who may not flag', { props: { ...place, featureIndex: 5, mayFlag: false }, answers: { [ADDRESS]: { ...flags, mayFlag: false } } }, ({ text, has }) => {
      expect(text()).toContain('No flag on this feature.')
      expect(has('Flag')).toBe(false)
    }),
  ],
  'flag/FlagForm': [
    holds(FlagForm, 'flags many at once, or says what is missing', { props: { ...place, featureIndexes: [1, 2, 3] }, answers: { [ADDRESS]: flags, [`POST ${ADDRESS}`]: refusal('Please fill this in.', 'reason') } }, async ({ fill, send, control, press, asked, emitted, until }) => {
      await fill('Kind', 'artefact')
      expect(control('Flag 3 features').attributes('type')).toBe('submit')
      await send()
      await until(() => expect(control('Reason').attributes('aria-invalid')).toBe('true'))
      expect(asked.find(({ method }) => method === 'POST')?.body).toEqual({ featureIndexes: [1, 2, 3], kind: 'artefact', reason: '' })
      expect(emitted('done')).toEqual([])
      await press('Cancel')
      expect(emitted('done')).toHaveLength(1)
    }),
  ],
  'flag/FlagList': [
    holds(FlagList, 'says who flagged and why, and takes back the one that is meant', { props: { flags: [flag, { ...flag, id: 'f2', kind: 'askAgain', reason: 'odd' }], mayFlag: true, busy: false } }, async ({ text, press, emitted }) => {
      expect(text()).toContain('contaminant: plasticiserEve Lark, 3 Feb 2026')
      await press('Take back: ask again')
      expect(emitted('takeBack')).toEqual([['f2']])
    }),
  ],
  'flag/FlagMany': [
    holds(FlagMany, 'offers itself once a filter stands', { props: { ...place, features: Int32Array.of(3, 8) }, answers: { [ADDRESS]: flags } }, async ({ has, press, find, until }) => {
      expect(has(/^Flag these/)).toBe(false)
      useBenchStore().toggleVerdict('onlyA')
      await until(() => expect(has('Flag these 2')).toBe(true))
      await press('Flag these 2')
      expect(find('[role=dialog]').text()).toContain('on each of the 2 features that pass the filter')
    }),
  ],
  'flag/FlagMark': [
    holds(FlagMark, 'is a letter that is read out as a word', { props: { kind: 'oneSideOnly' } }, ({ find }) => {
      expect(find('[role=img]').attributes('aria-label')).toBe('flag: one side only')
      expect(find('[role=img]').text()).toBe('o')
    }),
  ],
  'flag/FlagMarks': [
    holds(FlagMarks, 'shows each kind once', { props: { flags: [flag, { ...flag, id: 'f2' }, { ...flag, id: 'f3', kind: 'artefact' }] } }, ({ text }) => {
      expect(text()).toBe('ca')
    }),
  ],
  'flag/FlagUndo': [
    holds(FlagUndo, 'says nothing before something was done, and why undoing failed', { props: place, answers: { [ADDRESS]: flags, [`PATCH ${ADDRESS}`]: refusal('This flag is gone.') } }, async ({ find, press, text, until }) => {
      expect(find('[role=status]').text()).toBe('')
      useState('flag-act-a1').value = { sentence: '2 flags set.', flagIds: ['f1', 'f2'], takenBack: false }
      await until(() => expect(text()).toContain('2 flags set.'))
      await press('Undo')
      await until(() => expect(text()).toContain('This flag is gone.'))
    }),
  ],
  'flag/FlaggedFeatureTable': [
    holds(FlaggedFeatureTable, 'leads to the feature on the bench where it was judged', { props: { studyId: 's1', flags: [found, { ...found, id: 'f2', judged: null, practice: true }] } }, ({ control, text }) => {
      expect(control('m/z 301.1234 on the bench').attributes('href')).toBe('/studies/s1/comparisons/c1?version=2&feature=5')
      expect(text()).toContain('found only in Millrace')
      expect(text()).toContain('not compared yetalignment 1')
      expect(text()).toContain('practice, seen by you alone')
    }),
  ],
}
