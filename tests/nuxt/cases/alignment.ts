import { expect } from 'vitest'
import { reactive } from 'vue'
import AlignedTableList from '~/components/alignment/AlignedTableList.vue'
import AlignmentDelete from '~/components/alignment/AlignmentDelete.vue'
import AlignmentFacts from '~/components/alignment/AlignmentFacts.vue'
import AlignmentForm from '~/components/alignment/AlignmentForm.vue'
import AlignmentHeading from '~/components/alignment/AlignmentHeading.vue'
import AlignmentList from '~/components/alignment/AlignmentList.vue'
import AlignmentRun from '~/components/alignment/AlignmentRun.vue'
import AlignmentSettingsPanel from '~/components/alignment/AlignmentSettingsPanel.vue'
import ReadyTables from '~/components/alignment/ReadyTables.vue'
import { alignmentDefaults } from '#shared/science/alignment/settings'
import type { AlignableTables, AlignedTable, AlignmentDetail, AlignmentLine } from '#shared/types/alignment'
import { holds, type ComponentRows } from './componentCase'
import { refusal } from './mountCase'

const table: AlignedTable = {
  tableId: 't1', sampleName: 'M1', fileName: 'm1.csv', digest: 'aa', features: 12_000, matched: 9000, leftOut: 12, offsetPpm: -2.34, offsetApplied: true, timeCorrected: true,
  landmarks: 320, reason: 'Offset taken out; drift corrected.', drift: [[1, 0.02]], residualMedianPpm: 0.84, residualMedianMinutes: 0.0123,
}
const line: AlignmentLine = {
  id: 'a1', number: 1, practice: false, asGiven: false, settings: alignmentDefaults, differs: [], groups: 14_000, tables: 2, comparisons: 1, createdByName: 'Eve Lark', createdAt: '2026-02-03T11:30:00.000Z',
}
const lone = { ...table, tableId: 't2', sampleName: 'M2', matched: 0, offsetPpm: 0, residualMedianPpm: null, residualMedianMinutes: null }
const detail: AlignmentDetail = { ...line, engineVersion: '3', reference: 0, groupSizes: [5000, 9000], aligned: [table, lone] }
const one = { id: 't1', sampleName: 'M1', features: 12_000, digest: 'aa', blank: false, wide: false }
const ready: AlignableTables = { tables: [one, { ...one, id: 't2', sampleName: 'blank', digest: 'bb', blank: true }], withoutSample: [], problem: null }
const POST = 'POST /api/studies/s1/alignments'
const job = { id: 'j1', kind: 'align', status: 'running', progress: 0.4, message: 'Grouping', resultId: null }

export const alignmentRows: ComponentRows = {
  'alignment/AlignedTableList': [
    holds(AlignedTableList, 'says what was done to each table, and what could not be measured', { props: { tables: [table, lone], reference: 0 } }, ({ text }) => {
      expect(text()).toContain('M1referencem1.csv12 00075 %12−2.30.80.012Offset taken out')
      expect(text()).toContain('none shared')
    }),
  ],
  'alignment/AlignmentDelete': [
    holds(AlignmentDelete, 'says what goes with it, and goes to the list', { props: { alignmentId: 'a1', comparisons: 2 }, answers: { 'DELETE /api/studies/s1/alignments/a1': {} } }, async ({ press, text, went, until }) => {
      await press('Delete this practice run')
      expect(text()).toContain('with its flags and the 2 comparisons made from it')
      await press('Delete it')
      await until(() => expect(went).toEqual(['/studies/s1/alignments']))
    }),
  ],
  'alignment/AlignmentFacts': [
    holds(AlignmentFacts, 'adds up over the tables', { props: { alignment: detail } }, ({ text }) => {
      expect(text()).toContain('features in them24 000')
      expect(text()).toContain('features found again in another table9 000 38 %')
    }),
    holds(AlignmentFacts, 'has no share of nothing', { props: { alignment: { ...detail, aligned: [], tables: 0, groups: 0 } } }, ({ text }) => {
      expect(text()).toContain('0 none')
    }),
  ],
  'alignment/AlignmentForm': [
    holds(AlignmentForm, 'aligns by the defaults', { props: { ready, before: null }, answers: { [POST]: { jobId: 'j1' } } }, async ({ control, send, asked, emitted, has, until }) => {
      expect(has('Back to the defaults')).toBe(false)
      expect(control('Align 2 tables').attributes('disabled')).toBeUndefined()
      await send()
      await until(() => expect(emitted('started')).toEqual([['j1']]))
      expect(asked.at(-1)?.body).toEqual({ settings: alignmentDefaults, asGiven: false, practice: false, rerunOf: null })
    }),
    holds(AlignmentForm, 'says what differs from the run before, and warns where it is tighter', { props: { ready: { ...ready, tables: [{ ...one, wide: true }, one] }, before: line } }, async ({ find, text, fill, press }) => {
      expect(text()).toContain('The same settings.')
      await fill('Mass tolerance', '3')
      expect(text()).toContain('Mass tolerance 3 ppm (before: mass tolerance 10 ppm).')
      expect(find('[role=note]').text()).toContain('no finding')
      await fill(/^Take their rows/, true)
      expect(text()).toContain('taken as given (before: aligned anew)')
      await press('Back to the defaults')
      expect(document.querySelector('[role=note]')).toBeNull()
    }),
    holds(AlignmentForm, 'is practice for those who may not edit, and shows a refusal at its field', { props: { ready, before: null }, roles: ['student'], answers: { [POST]: refusal('From 0.1 to 100 ppm.', 'settings.alignMassPpm') } }, async ({ text, control, send, until }) => {
      expect(text()).toContain('Practise aligning 2 tables')
      await send()
      await until(() => expect(control('Mass tolerance').attributes('aria-invalid')).toBe('true'))
    }),
  ],
  'alignment/AlignmentHeading': [
    holds(AlignmentHeading, 'says what it is and leads on', { props: { alignment: { ...detail, differs: ['Mass tolerance: 10 ppm before, 7 now.'] } } }, ({ control, text }) => {
      expect(control('Compare the sides').attributes('href')).toBe('/studies/s1/comparisons?alignment=a1')
      expect(control('Matrix as CSV').attributes('href')).toBe('/api/studies/s1/alignments/a1/matrix.csv')
      expect(text()).toContain('within 10 ppm and their times within 0.1 min')
      expect(text()).toContain('10 ppm before, 7 now')
    }),
    holds(AlignmentHeading, 'lets those who export nothing take their own practice along', { props: { alignment: { ...detail, practice: true } }, roles: ['student'] }, ({ has, text }) => {
      expect([has('Matrix as CSV'), text().includes('practice, seen by you alone')]).toEqual([true, true])
    }),
  ],
  'alignment/AlignmentList': [
    holds(AlignmentList, 'leads to each run, with its settings and what rests on it', { props: { studyId: 's1', alignments: [line, { ...line, id: 'a2', number: 2, practice: true, asGiven: true, differs: ['Drift left.'] }] } }, ({ control, text }) => {
      expect(control('Alignment 2').attributes('href')).toBe('/studies/s1/alignments/a2')
      expect(text()).toContain('10 ppm · 0.1 min · offset taken out · drift corrected')
      expect(text()).toContain('2 tables · 14 000 aligned features · 1 comparison')
      expect(text()).toContain('rows as given')
    }),
  ],
  'alignment/AlignmentRun': [
    holds(AlignmentRun, 'shows how far a run is, and cancels it', { props: { jobId: 'j1', practice: true }, answers: { '/api/jobs/j1': job, 'DELETE /api/jobs/j1': {} } }, async ({ find, press, asked, until }) => {
      await until(() => expect(find('[role=progressbar]').attributes()).toMatchObject({ 'aria-valuenow': '40', 'aria-label': 'Practice run: Grouping' }))
      await press('Cancel')
      await until(() => expect(asked.map(({ method }) => method)).toContain('DELETE'))
    }),
    holds(AlignmentRun, 'tells once that it ended', { props: { jobId: 'j1', practice: false }, answers: { '/api/jobs/j1': { ...job, status: 'done', resultId: 'a3' } } }, async ({ emitted, has, until }) => {
      await until(() => expect(emitted('ended')).toHaveLength(1))
      expect(has('Cancel')).toBe(false)
    }),
  ],
  'alignment/AlignmentSettingsPanel': [
    holds(AlignmentSettingsPanel, 'says in words what the numbers mean while they are typed', { props: { tables: ready.tables, issue: () => undefined, modelValue: reactive({ ...alignmentDefaults }) } }, async ({ fill, text, control }) => {
      expect(text()).toContain('Below m/z 200 the mass tolerance stays at 0.002 Da.')
      await fill('Mass tolerance', '7')
      expect(text()).toContain('within 7 ppm')
      await fill('Mass tolerance', '')
      expect(text()).toContain('within … ppm')
      expect(control('Reference').findAll('option').map(each => each.text())).toEqual(['the table with most features, never a blank', 'M1, 12000 features'])
    }),
  ],
  'alignment/ReadyTables': [
    holds(ReadyTables, 'counts what is ready and names what stays out', { props: { ready: { ...ready, withoutSample: ['x.csv', 'y.csv'] } } }, ({ text, find }) => {
      expect(text()).toContain('2 tables stand ready, 1 blank among them, with 24 000 features.')
      expect(find('[role=note]').text()).toContain('2 tables without a sample stay out: x.csv, y.csv.')
    }),
  ],
}
