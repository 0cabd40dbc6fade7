import { expect } from 'vitest'
import LayoutAnswersForm from '~/components/table/LayoutAnswersForm.vue'
import LayoutColumns from '~/components/table/LayoutColumns.vue'
import LayoutForm from '~/components/table/LayoutForm.vue'
import LayoutPreview from '~/components/table/LayoutPreview.vue'
import LayoutQuestions from '~/components/table/LayoutQuestions.vue'
import LayoutSamples from '~/components/table/LayoutSamples.vue'
import { surveyTable } from '#shared/formats/delimitedText/surveyTable'
import { proposeLayout } from '#shared/science/table/proposeLayout'
import type { UploadDetail } from '#shared/types/table'
import { fileOf } from '../../support/readTableText'
import { holds, type ComponentRows } from './componentCase'
import { refusal } from './mountCase'

/** Times that are not said to be minutes or seconds: that has to be confirmed. */
const survey = await surveyTable(fileOf('m/z,RT,Area\n200.1,4.2,1000\n301.2,5.3,2000\n402.3,6.4,3000\n'))
const { guess } = proposeLayout(survey)
const wideSurvey = await surveyTable(fileOf('m/z,RT [min],M1,M2,T1\n200.1,4.2,1000,900,\n301.2,5.3,,2000,2100\n402.3,6.4,3000,,10\n'))
const wideGuess = proposeLayout(wideSurvey, { shape: 'wide' }).guess
const basis = { survey, answers: {}, remembered: false }
const inUpload = { studyId: 's1', uploadId: 'u1' }

export const waitingDetail: UploadDetail = {
  id: 'u1', fileName: 'odd.txt', bytes: 900, status: 'waiting', remark: null, jobId: null, progress: null, fingerprint: 'f', open: ['timeUnit'], createdAt: '2026-02-03T11:30:00.000Z', expiresAt: null, basis, tables: 0,
}
const question = { field: 'timeUnit' as const, sentence: 'Are times minutes?', choices: [{ value: 'minutes', label: 'minutes' }, { value: 'seconds', label: 'seconds' }], confirm: false }

export const layoutRows: ComponentRows = {
  'table/LayoutAnswersForm': [
    holds(LayoutAnswersForm, 'sends what was corrected', { props: { ...inUpload, fileName: 'odd.txt', basis, files: 2 }, answers: { 'PUT /api/studies/s1/uploads/u1/answers': {} } }, async ({ find, fill, send, asked, emitted, control, until }) => {
      expect(control('Read all 2 like this').attributes('disabled')).toBeUndefined()
      expect(find('[role=status]').text()).toMatch(/\d/)
      await fill('In', 'seconds')
      await send()
      await until(() => expect(emitted('answered')).toHaveLength(1))
      expect(asked.at(-1)?.body).toEqual({ answers: { timeUnit: 'seconds' } })
    }),
    holds(LayoutAnswersForm, 'says why the answer was refused', { props: { ...inUpload, fileName: 'odd.txt', basis, files: 1, again: true }, answers: { 'PUT /api/studies/s1/uploads/u1/answers': refusal('This file is gone.') } }, async ({ send, find, has, until }) => {
      expect(has('Read it again like this')).toBe(true)
      await send()
      await until(() => expect(find('[role=alert]').text()).toContain('This file is gone.'))
    }),
  ],
  'table/LayoutColumns': [
    holds(LayoutColumns, 'shows what each column is taken for, to be corrected', { props: { survey, guess } }, async ({ control, fill, emitted }) => {
      expect((control('Retention time').element as HTMLSelectElement).selectedOptions[0]?.text).toBe('2: RT')
      await fill('Peak width', '3: Area')
      await fill('In', 'seconds')
      expect(emitted('change')).toEqual([['widthColumn', 2], ['timeUnit', 'seconds']])
    }),
    holds(LayoutColumns, 'asks for the samples of a wide file, and for no intensity', { props: { survey: wideSurvey, guess: wideGuess } }, async ({ has, fill, emitted }) => {
      expect(has('Intensity')).toBe(false)
      await fill('M2', false)
      expect(emitted('change').at(-1)?.[0]).toBe('notSamples')
    }),
  ],
  'table/LayoutForm': [
    holds(LayoutForm, 'opens the file and asks what it leaves open', { props: { ...inUpload, files: 1 }, answers: { '/api/studies/s1/uploads/u1': waitingDetail } }, async ({ has, text, until }) => {
      await until(() => expect(has('Read it like this')).toBe(true))
      expect(text()).toContain('3 rows')
    }),
    holds(LayoutForm, 'says why it can\'t be opened', { props: { ...inUpload, files: 1 }, answers: { '/api/studies/s1/uploads/u1': refusal('There is no such file.') } }, async ({ find, until }) => {
      await until(() => expect(find('[role=alert]').text()).toContain('There is no such file.'))
    }),
  ],
  'table/LayoutPreview': [
    holds(LayoutPreview, 'shows first rows, and what is not read', { props: { survey, guess: { ...guess, intensityColumn: null }, fileName: 'odd.txt' } }, ({ text, find }) => {
      expect(find('[role=region]').attributes('aria-label')).toBe('First rows of odd.txt')
      expect(text()).toContain('not readArea')
      expect(text()).toContain('3 rows.')
    }),
  ],
  'table/LayoutQuestions': [
    holds(LayoutQuestions, 'asks in a sentence, nothing chosen beforehand', { props: { name: 'u1', questions: [question], chosen: () => undefined } }, async ({ find, control, fill, emitted }) => {
      expect(find('legend').text()).toBe('Are times minutes?')
      expect((control('minutes').element as HTMLInputElement).checked).toBe(false)
      await fill('seconds', true)
      expect(emitted('answer')).toEqual([['timeUnit', 'seconds']])
    }),
  ],
  'table/LayoutSamples': [
    holds(LayoutSamples, 'unticks a column that is no sample, and keeps it in sight', { props: { survey: wideSurvey, guess: wideGuess } }, async ({ change, fill, emitted, control }) => {
      await fill('M2', false)
      expect(emitted('change')).toEqual([[[3]]])
      await change({ guess: { ...wideGuess, sampleColumns: wideGuess.sampleColumns?.filter(({ column }) => column !== 3) } })
      expect((control('M2').element as HTMLInputElement).checked).toBe(false)
    }),
  ],
}
