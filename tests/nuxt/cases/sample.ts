import { expect } from 'vitest'
import { h, reactive } from 'vue'
import CopySampleSheet from '~/components/sample/CopySampleSheet.vue'
import SampleCellEditor from '~/components/sample/SampleCellEditor.vue'
import SampleCellText from '~/components/sample/SampleCellText.vue'
import SampleChoice from '~/components/sample/SampleChoice.vue'
import SampleGridHead from '~/components/sample/SampleGridHead.vue'
import SampleGridRow from '~/components/sample/SampleGridRow.vue'
import SampleSheet from '~/components/sample/SampleSheet.vue'
import SheetCellNote from '~/components/sample/SheetCellNote.vue'
import SheetDownload from '~/components/sample/SheetDownload.vue'
import SheetImport from '~/components/sample/SheetImport.vue'
import SheetImportPreview from '~/components/sample/SheetImportPreview.vue'
import SheetImportProblems from '~/components/sample/SheetImportProblems.vue'
import SheetNeeds from '~/components/sample/SheetNeeds.vue'
import SheetSaveState from '~/components/sample/SheetSaveState.vue'
import SheetToolbar from '~/components/sample/SheetToolbar.vue'
import { sampleSchema } from '#shared/schemas/sample'
import type { SampleRow } from '#shared/types/sample'
import { emptyDraft } from '~/utils/sampleSheet/draft'
import { needsOf } from '~/utils/sampleSheet/needs'
import { sheetRows } from '~/utils/sampleSheet/sheetRows'
import { holds, type ComponentRows } from './componentCase'

const names = { sideAName: 'Millrace', sideBName: 'Tallow Lane' }
const stored = (id: string, rest: Partial<SampleRow> = {}): SampleRow => ({ ...sampleSchema.parse({ name: id }), id, tables: 0, aligned: false, writtenBy: {}, ...rest })
const samples = [stored('M1', { side: 'A', amount: 12.5, tables: 1, aligned: true }), stored('T1', { side: 'B' })]
const typed = { ...emptyDraft(), typed: { M1: { amount: { text: 'about ten', from: 12.5 } }, T1: { side: { text: 'A', from: null } } }, gone: { X1: stored('X1') } }
const rows = sheetRows(samples, typed, names)
const needs = needsOf(rows)
const [first] = rows
if (!first) throw new Error('no row')
const row = { row: first, index: 0, names, activeColumn: -1, from: -1, to: -1, editing: null }
const csv = (text: string) => new File([text], 'samples.csv', { type: 'text/csv' })
const choose = async (element: HTMLElement, file: File) => {
  Object.defineProperty(element, 'files', { value: [file], configurable: true })
  element.dispatchEvent(new Event('change'))
}
const problem = { line: 3, column: 'amount', text: 'ten', sentence: 'Not a number.' }

export const sampleRows: ComponentRows = {
  'sample/CopySampleSheet': [
    holds(CopySampleSheet, 'says where the browser does not let it', { props: { address: '/demo/gone.csv' }, answers: { '/demo/gone.csv': () => 'name,kind\nM1,sample\n' } }, async ({ has, press, text, until }) => {
      // Where there is no clipboard the button is not offered at all.
      if (!has('Copy the sample sheet')) return expect(text()).toBe('')
      await press('Copy the sample sheet')
      await until(() => expect(text()).toMatch(/^Copied$|Please use the file\./))
    }),
  ],
  'sample/SampleCellEditor': [
    holds(SampleCellEditor, 'has the focus, offers the words of its column, and tells that it was left', { props: { field: 'side', label: 'side, row 1', names, modelValue: '' } }, async ({ control, fill, emitted }) => {
      expect(document.activeElement).toBe(control('side, row 1').element)
      expect([...document.querySelectorAll('option')].map(each => each.value)).toEqual(['A', 'B', 'Millrace', 'Tallow Lane'])
      await fill('side, row 1', 'B')
      expect(emitted('update:modelValue')).toEqual([['B']])
      await control('side, row 1').trigger('blur')
      expect(emitted('left')).toHaveLength(1)
    }),
    holds(SampleCellEditor, 'offers nothing where any word may stand', { props: { field: 'batch', label: 'batch, row 1', names, modelValue: '' } }, ({ control }) => {
      expect(control('batch, row 1').attributes('list')).toBeUndefined()
    }),
  ],
  'sample/SampleCellText': [
    holds(SampleCellText, 'shows the side\'s name beside its letter', { props: { field: 'side', text: 'B', mark: '', numeric: false, names } }, ({ text }) => expect(text()).toBe('■BTallow Lane')),
    holds(SampleCellText, 'marks what is wrong', { props: { field: 'amount', text: 'ten', mark: '!', numeric: true, names } }, ({ text }) => expect(text()).toBe('!ten')),
  ],
  'sample/SampleChoice': [
    holds(SampleChoice, 'offers samples that are free, and saves the choice', { props: { address: '/api/studies/s1/tables/t1', name: 'm1.csv', samples: [{ id: 'x1', name: 'M1' }, { id: 'x2', name: 'M2' }, { id: 'x3', name: 'T1' }], sampleId: 'x1', taken: new Set(['x1', 'x3']) }, answers: { 'PATCH /api/studies/s1/tables/t1': {} } }, async ({ control, fill, asked, emitted, until }) => {
      expect(control('Sample of m1.csv').findAll('option').map(each => each.text())).toEqual(['choose a sample', 'M1', 'M2'])
      await fill('Sample of m1.csv', 'choose a sample')
      await until(() => expect(emitted('changed')).toHaveLength(1))
      expect(asked.at(-1)?.body).toEqual({ sampleId: null })
    }),
  ],
  'sample/SampleGrid': { test: 'tests/nuxt/sample/SampleGrid.test.ts' },
  'sample/SampleGridHead': [
    holds(SampleGridHead, 'names every column, with units', {}, ({ text }) => {
      expect(document.querySelectorAll('th[scope=col]')).toHaveLength(12)
      expect(text()).toContain('volume (mL)')
    }),
  ],
  'sample/SampleGridRow': [
    holds(SampleGridRow, 'says what is wrong with a cell, and hands on where it was pressed', { props: row }, async ({ find, text, emitted }) => {
      expect(text()).toContain('1 ▪1 table')
      expect(find('[aria-invalid=true]').attributes('title')).toContain('Not a number.')
      await find('[data-place="0-3"]').trigger('mousedown')
      await find('[data-place="0-3"]').trigger('dblclick')
      expect([emitted('press')[0]?.[0], emitted('open').length]).toEqual([3, 1])
    }),
    holds(SampleGridRow, 'is edited where it is active', { props: { ...row, activeColumn: 0, from: 0, to: 0, editing: 'M1' }, beside: () => h('p', { id: 'cell-note' }, 'Name.') }, async ({ fill, emitted, find }) => {
      expect(find('[aria-selected=true]').attributes('tabindex')).toBe('0')
      await fill('name, row 1', 'M1b')
      expect(emitted('update:editing')).toEqual([['M1b']])
    }),
  ],
  'sample/SampleSheet': [
    holds(SampleSheet, 'saves by itself what was changed, and counts rows anew', {
      props: { samples, draft: reactive(emptyDraft()) },
      answers: { '/api/studies/s1/samples': { samples }, 'PATCH /api/studies/s1/samples': { samples: [...samples, stored('M2')], conflicts: [], refusals: [], added: {} } },
    }, async ({ press, fill, find, asked, refreshed, control, until }) => {
      expect(document.querySelectorAll('tbody tr')).toHaveLength(2)
      expect(control('CSV out').attributes('href')).toBe('/api/studies/s1/samples/csv')
      await fill('Rows to add', '2')
      await press('Add')
      await until(() => expect(document.querySelectorAll('tbody tr').length).toBeGreaterThan(2))
      expect(document.activeElement?.getAttribute('data-place')).toBe('2-0')
      document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key: 'q', bubbles: true, cancelable: true }))
      await until(() => expect(find('td input').element).toBeTruthy())
      await find('td input').setValue('M2')
      document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true, cancelable: true }))
      await until(() => expect(asked.some(({ method }) => method === 'PATCH')).toBe(true))
      await until(() => expect(refreshed()).toBeGreaterThan(0))
    }),
    holds(SampleSheet, 'is only read by those who may not edit it', { props: { samples, draft: reactive(emptyDraft()) }, roles: ['student'] }, ({ has, find }) => {
      expect([has('Add'), has('CSV in'), has('CSV out')]).toEqual([false, false, false])
      expect(find('[role=grid]').attributes('aria-readonly')).toBe('true')
    }),
  ],
  'sample/SheetCellNote': [
    holds(SheetCellNote, 'says what belongs into the cell', { props: { field: 'side', sentence: '', names } }, ({ text }) => expect(text()).toBe('Side: A for Millrace, B for Tallow Lane, empty for none.')),
    holds(SheetCellNote, 'says what is wrong with it first', { props: { field: 'side', sentence: 'A, B or empty.', names } }, ({ text }) => expect(text()).toBe('A, B or empty.')),
  ],
  'sample/SheetDownload': [
    holds(SheetDownload, 'leads to the sheet as CSV', { props: { studyId: 's1' } }, ({ control }) => expect(control('CSV out').attributes()).toMatchObject({ href: '/api/studies/s1/samples/csv', download: 'sample-sheet.csv' })),
  ],
  'sample/SheetImport': [
    holds(SheetImport, 'shows what a file would bring, then brings it in', { props: { standing: new Set(['m1']), names } }, async ({ control, find, press, emitted, until }) => {
      await choose(control('CSV file of samples').element, csv('name,side\nM1,A\nM9,B\n'))
      await until(() => expect(find('[role=dialog]').text()).toContain('1 new, 1 that change samples'))
      await press('Bring in 2 rows')
      expect(emitted('rows')).toEqual([[[{ name: 'M1', side: 'A' }, { name: 'M9', side: 'B' }]]])
    }),
    holds(SheetImport, 'says that a file is no sample sheet', { props: { standing: new Set<string>(), names } }, async ({ control, find, has, until }) => {
      await choose(control('CSV file of samples').element, csv('200.1,4.2,1000\n'))
      await until(() => expect(find('[role=alert]').text()).toContain('does not name columns of a sample sheet'))
      expect(has(/^Bring in/)).toBe(false)
    }),
  ],
  'sample/SheetImportPreview': [
    holds(SheetImportPreview, 'shows the first rows, what is left out, and what is to be corrected', {
      props: { preview: { rows: Array.from({ length: 7 }, (_, i) => ({ name: `M${i}`, amount: '10' })), added: 5, changed: 2, refused: [{ ...problem, column: 'name' }], marked: [problem], unknown: ['rack'] } },
    }, ({ text }) => {
      expect(text()).toContain('5 new, 2 that change samples')
      expect(text()).toContain('left out: rack.')
      expect(document.querySelectorAll('tbody tr')).toHaveLength(5)
      expect(text()).toContain('and 2 more')
      expect(text()).toContain('Rows left out (1)')
      expect(text()).toContain('Cells to correct (1)')
    }),
  ],
  'sample/SheetImportProblems': [
    holds(SheetImportProblems, 'says where and what, fifty at most', { props: { title: 'Rows left out', problems: Array.from({ length: 53 }, (_, i) => ({ ...problem, line: i + 2 })) } }, ({ text }) => {
      expect(text()).toContain('Rows left out (53)')
      expect(text()).toContain('Line 2, column amount: “ten”. Not a number.')
      expect(text()).toContain('and 3 more')
    }),
  ],
  'sample/SheetNeeds': [
    holds(SheetNeeds, 'offers for each place what can be done there', { props: { needs } }, async ({ text, press, emitted }) => {
      expect(text()).toContain('3 places need you')
      await press(/^Go to the cell/)
      await press(/^Keep mine/)
      await press(/^Let it go/)
      expect([emitted('show'), emitted('mine')]).toEqual([[['M1', 'amount']], [['T1', 'side']]])
      expect(emitted('letGo')).toHaveLength(1)
    }),
    holds(SheetNeeds, 'is silent where nothing waits', { props: { needs: [] } }, ({ text }) => expect(text()).toBe('')),
  ],
  'sample/SheetSaveState': [
    holds(SheetSaveState, 'says that all is safe', { props: { saving: false, problem: null, unsaved: false, needs: 0 } }, ({ find }) => expect(find('[role=status]').text()).toBe('Saved')),
    holds(SheetSaveState, 'says what waits for the person', { props: { saving: true, problem: null, unsaved: true, needs: 2 } }, ({ find }) => expect(find('[role=status]').text()).toBe('2 cells need you. Saving …')),
    holds(SheetSaveState, 'says why it is not saved and tries again', { props: { saving: false, problem: 'The server did not answer.', unsaved: true, needs: 0 } }, async ({ find, press, emitted }) => {
      expect(find('[role=status]').text()).toBe('Not saved: The server did not answer.')
      await press('Try again')
      expect(emitted('retry')).toHaveLength(1)
    }),
  ],
  'sample/SheetToolbar': [
    holds(SheetToolbar, 'adds as many rows as asked, five hundred at most', { props: { selected: 0, tables: 0, aligned: 0 } }, async ({ fill, send, control, emitted }) => {
      expect(control('Delete 0 rows').attributes('disabled')).toBe('')
      await fill('Rows to add', '900')
      await send()
      await fill('Rows to add', '')
      await send()
      expect(emitted('add')).toEqual([[500]])
    }),
    holds(SheetToolbar, 'says what deleting rows means', { props: { selected: 3, tables: 2, aligned: 1 } }, async ({ press, text, emitted }) => {
      await press('Delete 3 rows')
      expect(text()).toContain('2 rows will go from the sheet. The 2 feature tables that stand on them stay, without a sample. 1 row stands in an alignment and will stay.')
      await press('Delete 2 rows')
      expect(emitted('remove')).toHaveLength(1)
    }),
  ],
}
