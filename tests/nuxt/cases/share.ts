import { expect } from 'vitest'
import SharedBench from '~/components/share/SharedBench.vue'
import SharedCautions from '~/components/share/SharedCautions.vue'
import SharedHeading from '~/components/share/SharedHeading.vue'
import ShareButton from '~/components/share/ShareButton.vue'
import ShareForm from '~/components/share/ShareForm.vue'
import ShareLinkTable from '~/components/share/ShareLinkTable.vue'
import ShareMade from '~/components/share/ShareMade.vue'
import { packComparisonData } from '#shared/formats/comparisonData'
import { packSampleTraces } from '#shared/formats/traceColumns'
import { packVerdicts } from '#shared/formats/verdictColumns'
import { holds, type ComponentRows } from './componentCase'
import { inventedVersion, judged } from './inventedComparison'
import { refusal } from './mountCase'

const ENDS = '2026-03-01T10:00:00.000Z'
const shared = { ...inventedVersion, title: 'Millrace against Tallow Lane', alignMassPpm: 10, endsAt: ENDS, mayExport: true }
const link = { id: 'l1', label: 'the miller', allowExport: false, by: 'Eve Lark', at: '2026-02-03T11:30:00.000Z', comparisonId: 'c1', comparisonTitle: 'Millrace against Tallow Lane', versionId: 'v1', versionNumber: 2, endsAt: ENDS, withdrawnAt: null, state: 'inForce' as const }
const made = { secret: 'abc', endsAt: ENDS }

export const shareRows: ComponentRows = {
  'share/ShareButton': [
    holds(ShareButton, 'makes a link in a dialog and shows it once', { props: { studyId: 's1', versionId: 'v1', versionNumber: 2 }, answers: { 'POST /api/studies/s1/share-links': made } }, async ({ press, send, control, find, text, until }) => {
      await press('Share')
      expect(find('[role=dialog]').text()).toContain('Share version 2')
      expect(control('All share links of this study').attributes('href')).toBe('/studies/s1/share-links')
      await send()
      await until(() => expect(text()).toContain('It is shown this once'))
      expect((control('Address').element as HTMLInputElement).value).toMatch(/\/shared\/abc$/)
    }),
  ],
  'share/ShareForm': [
    holds(ShareForm, 'sends for whom, how long and whether with CSV', { props: { studyId: 's1', versionId: 'v1' }, answers: { 'POST /api/studies/s1/share-links': made } }, async ({ fill, send, asked, emitted, text, until }) => {
      expect(text()).toMatch(/In force until \d+ \w{3,4} \d{4}\./)
      await fill('For whom', 'the miller')
      await fill('In force for', '7')
      await fill('The guest may download the verdicts as CSV', true)
      await send()
      await until(() => expect(emitted('made')).toHaveLength(1))
      expect(asked.at(-1)?.body).toEqual({ versionId: 'v1', label: 'the miller', days: 7, allowExport: true })
    }),
    holds(ShareForm, 'says what is wrong with the days', { props: { studyId: 's1', versionId: 'v1' }, answers: { 'POST /api/studies/s1/share-links': refusal('At most 365 days.', 'days') } }, async ({ fill, send, control, text, until }) => {
      await fill('In force for', '999')
      expect(text()).not.toContain('In force until')
      await send()
      await until(() => expect(control('In force for').attributes('aria-invalid')).toBe('true'))
    }),
  ],
  'share/ShareLinkTable': [
    holds(ShareLinkTable, 'tells of each link, and withdraws the one that is meant', { props: { studyId: 's1', busy: false, links: [link, { ...link, id: 'l2', label: '', state: 'withdrawn' }] } }, async ({ text, press, emitted, find, until }) => {
      expect(text()).toContain('not noted')
      expect(text()).toContain('withdrawn')
      expect(document.querySelector('td a')?.getAttribute('href')).toBe('/studies/s1/comparisons/c1?version=2')
      await press(/^Withdraw\s?access for the miller$/)
      await until(() => expect(find('[role=dialog]').text()).toContain('The address stops working at once'))
      await press('Withdraw the link')
      expect(emitted('withdraw')).toEqual([['l1']])
    }),
  ],
  'share/ShareMade': [
    holds(ShareMade, 'shows the address and until when it holds', { props: { address: 'http://127.0.0.1/shared/abc', endsAt: ENDS } }, ({ text, control }) => {
      expect(text()).toContain('until 1 Mar 2026')
      expect(control('Address').attributes('readonly')).toBe('')
    }),
  ],
  'share/SharedBench': [
    holds(SharedBench, 'is the bench without anything to save or flag', {
      props: { shared, address: '/api/shared/abc' }, answers: { '/api/shared/abc/data': packVerdicts(judged.result), '/api/shared/abc/input': packComparisonData(judged.input), '/api/shared/abc/traces': packSampleTraces([]) },
    }, async ({ control, has, find, until }) => {
      await until(() => expect(find('[role=grid]').attributes('aria-rowcount')).toMatch(/^\d{2,}$/))
      expect(control('Verdicts as CSV').attributes('href')).toBe('/api/shared/abc/verdicts.csv')
      expect(has('Save as a new version')).toBe(false)
      expect(has(/^Flag/)).toBe(false)
    }),
  ],
  'share/SharedCautions': [
    holds(SharedCautions, 'names the tolerance that features were told apart by', { props: { massPpm: 7 } }, ({ text, find }) => {
      expect(text()).toContain('within 7 ppm')
      expect(find('[role=note]').text()).toContain('not a confirmed identification')
    }),
  ],
  'share/SharedHeading': [
    holds(SharedHeading, 'says which version it is and until when', { props: { shared } }, ({ find, text }) => {
      expect(find('h1').text()).toBe('Millrace against Tallow Lane')
      expect(text()).toContain('Version 2, saved 3 Feb 2026')
      expect(text()).toContain('until 1 Mar 2026')
    }),
  ],
}
