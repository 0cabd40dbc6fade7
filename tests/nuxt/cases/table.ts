import { expect } from 'vitest'
import FileSendings from '~/components/table/FileSendings.vue'
import RefusedRows from '~/components/table/RefusedRows.vue'
import TableDetails from '~/components/table/TableDetails.vue'
import TableDropZone from '~/components/table/TableDropZone.vue'
import TableFloor from '~/components/table/TableFloor.vue'
import TableList from '~/components/table/TableList.vue'
import TableRow from '~/components/table/TableRow.vue'
import UploadsReading from '~/components/table/UploadsReading.vue'
import UploadsRefused from '~/components/table/UploadsRefused.vue'
import UploadsWaiting from '~/components/table/UploadsWaiting.vue'
import type { TableLine, UploadLine } from '#shared/types/table'
import type { Sending } from '~/composables/useFileSending'
import { holds, type ComponentRows } from './componentCase'
import { layoutRows, waitingDetail } from './layout'
import { refusal } from './mountCase'

const table: TableLine = {
  id: 't1', uploadId: 'u1', fileName: 'm1.csv', columnName: null, wideGroup: null, sampleId: 'x1', sampleName: 'M1', features: 12_345, refusedRows: 2, measure: 'area', timeUnit: 'minutes',
  massKind: 'mz', bytes: 2_000_000, digest: 'a'.repeat(64), gapFilled: false, statedFloor: null, remark: null, createdAt: '2026-02-03T11:30:00.000Z', createdByName: 'Eve Lark', alignments: 0, replacedAt: null, replacedByFile: null,
}
const replaced: TableLine = { ...table, id: 't0', alignments: 2, replacedAt: '2026-02-04T09:30:00.000Z', replacedByFile: 'm1b.csv' }
const samples = [{ id: 'x1', name: 'M1' }, { id: 'x2', name: 'M2' }, { id: 'x3', name: 'T1' }]
const rights = { mayEdit: true, mayExport: true }
const inStudy = { studyId: 's1', samples, taken: new Set(['x1', 'x3']) }
const upload: UploadLine = { id: 'u9', fileName: 'odd.txt', bytes: 900, status: 'reading', remark: null, jobId: 'j1', progress: { share: 0.25, message: 'Reading rows' }, fingerprint: 'f', open: [], createdAt: '2026-02-03T11:30:00.000Z', expiresAt: null }
const waiting: UploadLine = { ...upload, status: 'waiting', progress: null, open: ['timeUnit'], expiresAt: '2026-02-10T09:30:00.000Z' }
const sending: Sending = { key: 1, name: 'm1.csv', bytes: 4096, sent: 1024, state: 'sending', sentence: '' }
const file = new File(['x'], 'new.csv')
const give = (element: HTMLElement, files: File[]) => {
  Object.defineProperty(element, 'files', { value: files, configurable: true })
  element.dispatchEvent(new Event('change'))
}

export const tableRows: ComponentRows = {
  ...layoutRows,
  'table/FileSendings': [
    holds(FileSendings, 'shows what is under way in numbers, and what failed with its reason', {
      props: { sendings: [sending, { ...sending, key: 2, name: 'm2.csv', state: 'failed', sentence: 'The connection was lost.' }, { ...sending, key: 3, name: 'm3.csv', state: 'known', sentence: 'It is there already.' }], canRetry: () => true },
    }, async ({ find, press, emitted }) => {
      expect(find('[role=progressbar]').attributes()).toMatchObject({ 'aria-label': 'm1.csv: 1.0 kB of 4.0 kB', 'aria-valuenow': '25' })
      expect(find('[role=alert]').text()).toBe('The connection was lost.')
      await press('Send m2.csv again')
      await press('Cancel m1.csv')
      await press('Clear m3.csv')
      expect([emitted('again'), emitted('drop')]).toEqual([[[2]], [[1], [3]]])
    }),
  ],
  'table/RefusedRows': [
    holds(RefusedRows, 'reads the rows when it is opened', { props: { studyId: 's1', table, mayExport: true, open: false }, answers: { '/api/studies/s1/tables/t1/refused': { rows: [{ line: 7, column: 'm/z', value: '', reason: 'empty' }] } } }, async ({ change, text, control, asked, until }) => {
      expect(asked.filter(({ path }) => path.endsWith('refused'))).toEqual([])
      await change({ open: true })
      await until(() => expect(text()).toContain('7m/znothingempty'))
      expect(control('Download all as CSV').attributes('href')).toBe('/api/studies/s1/tables/t1/refused.csv')
    }),
  ],
  'table/TableDetails': [
    holds(TableDetails, 'tells all of a table, and removes it after asking', { props: { studyId: 's1', table, ...rights, open: true }, answers: { 'DELETE /api/studies/s1/tables/t1': {} } }, async ({ text, press, emitted, control, until }) => {
      expect(text()).toContain('Features12 345')
      expect(text()).toContain('Intensities arepeak areas')
      expect(control('Download the original').attributes('href')).toBe('/api/studies/s1/tables/t1/original')
      await press('Remove')
      expect(text()).toContain('goes, and so does its original')
      await press('Remove it')
      await until(() => expect(emitted('changed')).toHaveLength(1))
    }),
    holds(TableDetails, 'hands on the file that replaces it, and closes', { props: { studyId: 's1', table, ...rights, open: true } }, async ({ control, emitted, text, until }) => {
      give(control('The file that replaces this table').element, [file])
      expect(emitted('replace')).toEqual([[file]])
      await until(() => expect(text()).toBe(''))
    }),
    holds(TableDetails, 'opens how it was read', { props: { studyId: 's1', table: { ...table, alignments: 2, gapFilled: true }, ...rights, open: true }, answers: { '/api/studies/s1/uploads/u1': waitingDetail } }, async ({ press, control, text, has, until }) => {
      expect(text()).toContain('2 alignments rest on this table.')
      expect(text()).toContain('seems gap-filled')
      expect(has('Remove')).toBe(false)
      await press('Read it differently')
      expect(control('Read it differently').attributes('aria-expanded')).toBe('true')
      await until(() => expect(has('Read it again like this')).toBe(true))
    }),
    holds(TableDetails, 'offers nothing to those who only read', { props: { studyId: 's1', table: { ...table, statedFloor: 500 }, mayEdit: false, mayExport: false, open: true } }, ({ text, has }) => {
      expect(text()).toContain('Peak limit: 500 counts')
      expect([has('Download the original'), has('Read it differently'), has('Remove')]).toEqual([false, false, false])
    }),
  ],
  'table/TableDropZone': [
    holds(TableDropZone, 'takes files chosen or dropped', {}, async ({ control, find, text, emitted }) => {
      expect(text()).toContain('2 000 000 rows a file')
      give(control('feature tables').element, [file])
      await find('section').trigger('drop', { dataTransfer: { files: [file, file] } })
      expect(emitted('files')).toEqual([[[file]], [[file, file]]])
    }),
  ],
  'table/TableFloor': [
    holds(TableFloor, 'saves a changed limit only', { props: { address: '/api/studies/s1/tables/t1', stated: null }, answers: { 'PATCH /api/studies/s1/tables/t1': {} } }, async ({ control, fill, send, find, asked, emitted, until }) => {
      expect(control('Save the peak limit').attributes('disabled')).toBe('')
      await fill('Peak limit', '500')
      await send()
      await until(() => expect(find('[role=status]').text()).toBe('Saved.'))
      expect([asked.at(-1)?.body, emitted('changed').length]).toEqual([{ statedFloor: 500 }, 1])
    }),
  ],
  'table/TableList': [
    holds(TableList, 'shows what stands, and what was replaced on wish', { props: { studyId: 's1', tables: [table, replaced], samples, ...rights } }, async ({ fill, text }) => {
      expect(document.querySelectorAll('tbody tr')).toHaveLength(1)
      await fill('Show the table that was replaced', true)
      expect(document.querySelectorAll('tbody tr')).toHaveLength(2)
      expect(text()).toContain('replaced by m1b.csv; 2 alignments rest on it')
    }),
  ],
  'table/TableRow': [
    holds(TableRow, 'gives the table to a sample that is free', { props: { ...inStudy, table, ...rights }, answers: { 'PATCH /api/studies/s1/tables/t1': {} } }, async ({ control, fill, asked, emitted, until }) => {
      expect(control('Sample of m1.csv').findAll('option').map(each => each.text())).toEqual(['choose a sample', 'M1', 'M2'])
      await fill('Sample of m1.csv', 'M2')
      await until(() => expect(emitted('changed')).toHaveLength(1))
      expect(asked.at(-1)?.body).toEqual({ sampleId: 'x2' })
    }),
    holds(TableRow, 'opens what there is to know, and the rows that were refused', { props: { ...inStudy, table, ...rights }, answers: { '/api/studies/s1/tables/t1/refused': { rows: [] } } }, async ({ press, find }) => {
      await press('2 refused rows of m1.csv')
      expect(find('[role=dialog]').text()).toContain('Refused rows of m1.csv')
      await press('Close')
      await press('More about m1.csv')
      expect(find('[role=dialog]').text()).toContain('Digest')
    }),
    holds(TableRow, 'says why the sample could not be taken', { props: { ...inStudy, table: { ...table, columnName: 'M 1', refusedRows: 0, measure: 'unknown' }, ...rights }, answers: { 'PATCH /api/studies/s1/tables/t1': refusal('Another table stands on it.') } }, async ({ fill, find, text, until }) => {
      expect(text()).toContain('not known')
      await fill('Sample of M 1 in m1.csv', 'M2')
      await until(() => expect(find('[role=alert]').text()).toBe('Another table stands on it.'))
    }),
  ],
  'table/UploadsReading': [
    holds(UploadsReading, 'shows how far each file is, and cancels it', { props: { uploads: [upload, { ...upload, id: 'u8', fileName: 'next.txt', progress: null }], mayEdit: true } }, async ({ text, press, emitted }) => {
      expect(text()).toContain('odd.txt: Reading rows25 %')
      expect(text()).toContain('next.txt: Waiting for its turn.0 %')
      await press('Cancel odd.txt')
      expect(emitted('remove')).toEqual([['u9']])
    }),
  ],
  'table/UploadsRefused': [
    holds(UploadsRefused, 'says why, and clears the line', { props: { uploads: [{ ...upload, status: 'refused', remark: 'It has no column of m/z.' }], mayEdit: true } }, async ({ find, press, emitted }) => {
      expect(find('[role=alert]').text()).toContain('odd.txt (900 B): It has no column of m/z.')
      await press('Clear odd.txt')
      expect(emitted('remove')).toEqual([['u9']])
    }),
  ],
  'table/UploadsWaiting': [
    holds(UploadsWaiting, 'asks once for files of one shape', { props: { studyId: 's1', uploads: [waiting, { ...waiting, id: 'u8', fileName: 'odd 2.txt' }], mayEdit: true }, answers: { '/api/studies/s1/uploads/u9': waitingDetail } }, async ({ text, find, press, emitted, has, until }) => {
      expect(text()).toContain('2 files wait for your answer')
      expect(text()).toContain('waits until 10 Feb 2026')
      await until(() => expect(has('Read all 2 like this')).toBe(true))
      expect(find('form').element).toBeTruthy()
      await press(/^Remove\s?odd 2.txt$/)
      await press('Remove it')
      expect(emitted('remove')).toEqual([['u8']])
    }),
    holds(UploadsWaiting, 'says who has to answer to those who can\'t', { props: { studyId: 's1', uploads: [waiting], mayEdit: false } }, ({ text, has }) => {
      expect(text()).toContain('An analyst has to say how it is to be read.')
      expect(has(/Remove/)).toBe(false)
    }),
  ],
}
