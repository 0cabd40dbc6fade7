import { expect } from 'vitest'
import StudyArchive from '~/components/study/StudyArchive.vue'
import StudyFacts from '~/components/study/StudyFacts.vue'
import StudyForm from '~/components/study/StudyForm.vue'
import StudyHeader from '~/components/study/StudyHeader.vue'
import StudyMembersList from '~/components/study/StudyMembersList.vue'
import StudyNextStep from '~/components/study/StudyNextStep.vue'
import StudySearch from '~/components/study/StudySearch.vue'
import StudyTable from '~/components/study/StudyTable.vue'
import { holds, type ComponentRows } from './componentCase'
import { inventedMethod, inventedStudy } from './inventedStudy'
import { refusal } from './mountCase'

const ARCHIVED = '2026-03-01T10:00:00.000Z'
const members = { members: inventedStudy.members, others: [{ id: 'p2', name: 'Eve Lark', roles: ['reviewer'], closed: false }] }

export const studyRows: ComponentRows = {
  'study/DemoBeingMade': { test: 'tests/nuxt/study/DemoBeingMade.test.ts' },
  'study/StudyArchive': [
    holds(StudyArchive, 'archives after asking', { answers: { 'PUT /api/studies/s1/archive': {} } }, async ({ press, asked, refreshed, until }) => {
      await press('Archive')
      await press('Archive it')
      await until(() => expect(refreshed()).toBe(1))
      expect(asked.map(({ method }) => method)).toContain('PUT')
    }),
    holds(StudyArchive, 'brings an archived study back, or says why not', { study: { archivedAt: ARCHIVED }, answers: { 'DELETE /api/studies/s1/archive': refusal('Only a lab lead may do this.') } }, async ({ press, find, until }) => {
      await press('Bring it back')
      await until(() => expect(find('[role=alert]').text()).toContain('Only a lab lead'))
    }),
  ],
  'study/StudyFacts': [
    holds(StudyFacts, 'names sides, method and maker', { props: { study: { ...inventedStudy, matrix: '' } } }, ({ text, control }) => {
      expect(text()).toContain('Side A● Millrace')
      expect(text()).toContain('Matrixnot said')
      expect(text()).toContain('negative mode')
      expect(control('RP 15 min').attributes('href')).toBe('/methods#m1')
    }),
  ],
  'study/StudyForm': [
    holds(StudyForm, 'makes a study with the method that is there', { answers: { '/api/methods': { methods: [inventedMethod] }, 'POST /api/studies': { id: 's2' } } }, async ({ fill, send, asked, emitted, until }) => {
      await fill('Title', 'Three mills')
      await fill(/^Restricted/, true)
      await send()
      await until(() => expect(emitted('saved')).toEqual([['s2']]))
      expect(asked.at(-1)?.body).toMatchObject({ title: 'Three mills', methodId: 'm1', restricted: true, newMethod: null })
    }),
    holds(StudyForm, 'asks for a method where there is none, and says what is wrong with it', { answers: { '/api/methods': { methods: [] }, 'POST /api/studies': refusal('Choose negative or positive.', 'newMethod.polarity') } }, async ({ control, send, until }) => {
      expect(control('Name of the method').element).toBeTruthy()
      await send()
      await until(() => expect(control('Polarity').attributes('aria-invalid')).toBe('true'))
    }),
    holds(StudyForm, 'changes the study it is given', { props: { study: inventedStudy }, answers: { '/api/methods': { methods: [inventedMethod] }, 'PATCH /api/studies/s1': { id: 's1' } } }, async ({ control, send, emitted, until }) => {
      expect((control('Title').element as HTMLInputElement).value).toBe('Two mills')
      expect(control('Cancel').attributes('href')).toBe('/studies/s1')
      await send()
      await until(() => expect(emitted('saved')).toEqual([['s1']]))
    }),
  ],
  'study/StudyHeader': [
    holds(StudyHeader, 'leads to every part of the study, with counts', { props: { study: inventedStudy } }, ({ control, find, text }) => {
      expect(find('h1').text()).toBe('Two mills')
      expect(control(/^Samples\s?8$/).attributes('href')).toBe('/studies/s1/samples')
      expect(control('Share links').attributes('href')).toBe('/studies/s1/share-links')
      expect(text()).not.toContain('archived')
    }),
    holds(StudyHeader, 'says that an archived one is only read, and shows no share links to those who make none', { props: { study: { ...inventedStudy, archivedAt: ARCHIVED, restricted: true } }, roles: ['student'] }, ({ has, find, text }) => {
      expect(find('[role=note]').text()).toContain('it can be read, not changed')
      expect(text()).toContain('restricted to its members')
      expect(has('Share links')).toBe(false)
    }),
  ],
  'study/StudyMembersList': [
    holds(StudyMembersList, 'adds a member', { props: { study: inventedStudy }, answers: { '/api/studies/s1/members': members, 'PUT /api/studies/s1/members/p2': {} } }, async ({ text, control, fill, send, refreshed, until }) => {
      expect(text()).toContain('everyone in the laboratory may read it')
      expect(control('Add').attributes('disabled')).toBe('')
      await fill('Add a member', 'Eve Lark (reviewer)')
      await send()
      await until(() => expect(refreshed()).toBe(1))
    }),
    holds(StudyMembersList, 'only lists them to those who may not change them', { props: { study: { ...inventedStudy, restricted: true } }, roles: ['scientist'], answers: { '/api/studies/s1/members': { ...members, others: [] } } }, ({ text, has }) => {
      expect(text()).toContain('Only members see this study.')
      expect(text()).toContain('Ada Moss analyst')
      expect(has('Take out')).toBe(false)
    }),
    holds(StudyMembersList, 'leaves a restricted study with the one who took themselves out', { props: { study: { ...inventedStudy, restricted: true } }, answers: { '/api/studies/s1/members': members, 'DELETE /api/studies/s1/members/p1': {} } }, async ({ press, went, until }) => {
      await press(/^Take out\s?Ada Moss$/)
      await press('Take out')
      await until(() => expect(went).toEqual(['/']))
    }),
  ],
  'study/StudyNextStep': [
    holds(StudyNextStep, 'says what comes next and leads there', { study: { counts: { samples: 8, tables: 6, traces: 0, alignments: 0, comparisons: 0 } } }, ({ find, control }) => {
      expect(find('h2').text()).toBe('Align the tables')
      expect(control('Go to the alignments').attributes('href')).toBe('/studies/s1/alignments')
    }),
    holds(StudyNextStep, 'says what is waited for to those who can\'t do it', { roles: ['reviewer'], study: { counts: { samples: 0, tables: 0, traces: 0, alignments: 0, comparisons: 0 } } }, ({ text }) => {
      expect(text()).toContain('An analyst has to describe the samples first.')
      expect(document.querySelector('a')).toBeNull()
    }),
  ],
  'study/StudySearch': [
    holds(StudySearch, 'searches, and shows archived studies on wish', { props: { count: 2, search: '', archived: false } }, async ({ fill, emitted }) => {
      await fill('Search', 'mill')
      await fill('Show archived (2)', true)
      expect([emitted('update:search'), emitted('update:archived')]).toEqual([[['mill']], [[true]]])
    }),
    holds(StudySearch, 'does not offer what there is none of', { props: { count: 0, search: 'mill', archived: false } }, ({ has }) => {
      expect(has(/archived/)).toBe(false)
    }),
  ],
  'study/StudyTable': [
    holds(StudyTable, 'tells of each study what stands in it', { props: { studies: [{ ...inventedStudy, methodName: 'RP 15 min', restricted: true, archivedAt: ARCHIVED }] } }, ({ control, text }) => {
      expect(control('Two mills').attributes('href')).toBe('/studies/s1')
      expect(text()).toContain('apple juice · RP 15 min · restricted · archived')
      expect(text()).toContain('samples8')
    }),
  ],
}
