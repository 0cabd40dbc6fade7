import { expect } from 'vitest'
import { h } from 'vue'
import BaseButton from '~/components/base/BaseButton.vue'
import BaseDialog from '~/components/base/BaseDialog.vue'
import BaseField from '~/components/base/BaseField.vue'
import BaseMoment from '~/components/base/BaseMoment.vue'
import BaseNotice from '~/components/base/BaseNotice.vue'
import BeamMark from '~/components/base/BeamMark.vue'
import ChoiceRow from '~/components/base/ChoiceRow.vue'
import ConfirmButton from '~/components/base/ConfirmButton.vue'
import CopyField from '~/components/base/CopyField.vue'
import DemoBanner from '~/components/base/DemoBanner.vue'
import EmptyState from '~/components/base/EmptyState.vue'
import LinkButton from '~/components/base/LinkButton.vue'
import ProgressBar from '~/components/base/ProgressBar.vue'
import SelectField from '~/components/base/SelectField.vue'
import SkipLink from '~/components/base/SkipLink.vue'
import TextField from '~/components/base/TextField.vue'
import { holds, type ComponentRows } from './componentCase'

export const baseRows: ComponentRows = {
  'base/BaseButton': [
    holds(BaseButton, 'is no button of a form by itself', { slots: { default: () => 'Save' } }, async ({ control, press, emitted }) => {
      expect(control('Save').attributes()).toMatchObject({ type: 'button' })
      expect(control('Save').attributes('disabled')).toBeUndefined()
      await press('Save')
      expect(emitted('click')).toHaveLength(1)
    }),
    holds(BaseButton, 'can\'t be pressed while it is busy, and says so', { props: { busy: true, tone: 'danger', type: 'submit' }, slots: { default: () => 'Delete' } }, ({ control }) => {
      expect(control('Delete').attributes()).toMatchObject({ 'type': 'submit', 'disabled': '', 'aria-busy': 'true' })
    }),
  ],
  'base/BaseDialog': [
    holds(BaseDialog, 'has a name, a description and a way out', { props: { title: 'Share', description: 'For a guest.', open: true }, slots: { default: () => 'the form' } }, async ({ find, text, press, emitted }) => {
      expect(text()).toContain('the form')
      expect(document.querySelector(`[id="${find('[role=dialog]').attributes('aria-describedby')}"]`)?.textContent).toBe('For a guest.')
      await press('Close')
      expect(emitted('update:open')).toEqual([[false]])
    }),
    holds(BaseDialog, 'needs no description', { props: { title: 'Add a person', open: true }, slots: { default: () => 'the form' } }, ({ find }) => {
      expect(find('[role=dialog]').attributes('aria-describedby') ?? '').toBe('')
    }),
    holds(BaseDialog, 'shows nothing while it is closed', { props: { title: 'Share', open: false }, slots: { default: () => 'the form' } }, ({ text }) => {
      expect(text()).toBe('')
    }),
  ],
  'base/BaseField': [
    holds(BaseField, 'ties label and hint to the control', { props: { label: 'Weight', hint: 'As weighed.', unit: 'mg' }, slots: { default: ({ id, describedBy }: { id: string, describedBy: string }) => h('input', { id, 'aria-describedby': describedBy }) } }, ({ control, text }) => {
      expect(document.getElementById(control('Weight').attributes('aria-describedby') ?? '')?.textContent).toBe('As weighed.')
      expect(text()).toContain('mg')
    }),
    holds(BaseField, 'shows what is wrong in place of the hint', { props: { label: 'Weight', hint: 'As weighed.', error: 'Too large.' }, slots: { default: ({ id, describedBy, invalid }: { id: string, describedBy: string, invalid?: boolean }) => h('input', { id, 'aria-describedby': describedBy, 'aria-invalid': invalid }) } }, ({ control, text }) => {
      expect(control('Weight').attributes('aria-invalid')).toBe('true')
      expect(document.getElementById(control('Weight').attributes('aria-describedby') ?? '')?.textContent).toBe('Too large.')
      expect(text()).not.toContain('As weighed.')
    }),
  ],
  'base/BaseMoment': [
    holds(BaseMoment, 'says a moment in words and keeps it exact', { props: { at: '2026-02-03T12:30:00.000Z' } }, ({ find, text }) => {
      expect(text()).toMatch(/^[34] Feb 2026, \d\d:\d\d$/)
      expect(find('time').attributes('datetime')).toBe('2026-02-03T12:30:00.000Z')
    }),
  ],
  'base/BaseNotice': [
    holds(BaseNotice, 'is read out at once where something was refused', { props: { tone: 'danger' }, slots: { default: () => 'The file is empty.' } }, ({ find }) => {
      expect(find('[role=alert]').text()).toBe('Refused: The file is empty.')
    }),
    holds(BaseNotice, 'says that it is a caution, not by colour alone', { props: { tone: 'warn' }, slots: { default: () => 'One preparation.' } }, ({ find }) => {
      expect(find('[role=note]').text()).toBe('Caution: One preparation.')
    }),
  ],
  'base/BeamMark': [
    holds(BeamMark, 'is the name, its drawing hidden from readers', { props: { size: 'large' } }, ({ text, find }) => {
      expect(text()).toBe('Steelyard')
      expect(find('svg').attributes('aria-hidden')).toBe('true')
    }),
  ],
  'base/ChoiceRow': [
    holds(ChoiceRow, 'is a group of named choices, one of them chosen', { props: { label: 'Intensity', choices: [{ value: 'raw', label: 'as injected' }, { value: 'norm', label: 'normalised' }], modelValue: 'norm' } }, async ({ control, emitted, fill, find }) => {
      expect(find('legend').text()).toBe('Intensity')
      expect((control('normalised').element as HTMLInputElement).checked).toBe(true)
      await fill('as injected', true)
      expect(emitted('update:modelValue')).toEqual([['raw']])
    }),
  ],
  'base/ConfirmButton': [
    holds(ConfirmButton, 'asks before it acts', { props: { label: 'Remove', subject: 'apples.csv', question: 'The file goes.', confirm: 'Remove it' } }, async ({ press, text, emitted, find }) => {
      await press(/^Remove\s?apples.csv$/)
      expect(find('[role=dialog]').text()).toContain('Remove apples.csv')
      expect(text()).toContain('The file goes.')
      expect(emitted('confirmed')).toEqual([])
      await press('Remove it')
      expect(emitted('confirmed')).toHaveLength(1)
    }),
    holds(ConfirmButton, 'does nothing for those who keep it', { props: { label: 'Remove', question: 'The file goes.', confirm: 'Remove it' } }, async ({ press, emitted, text }) => {
      await press('Remove')
      await press('Keep it')
      expect(emitted('confirmed')).toEqual([])
      expect(text()).not.toContain('The file goes.')
    }),
  ],
  'base/CopyField': [
    holds(CopyField, 'says what to do where the browser does not allow copying', { props: { label: 'Address', value: 'http://127.0.0.1/shared/abc' } }, async ({ control, press, text, until }) => {
      const field = control('Address').element as HTMLInputElement
      expect(field.value).toBe('http://127.0.0.1/shared/abc')
      expect(field.readOnly).toBe(true)
      await press('Copy')
      await until(() => expect(text()).toMatch(/Copied\.|copy it by hand\./))
    }),
  ],
  'base/DemoBanner': [
    holds(DemoBanner, 'says that everything is invented', { slots: { default: () => 'Files' } }, ({ find }) => {
      expect(find('aside').text()).toMatch(/every study, sample and number here is invented\.\s+Files/)
    }),
  ],
  'base/DropZone': { test: 'tests/nuxt/trace/TraceRow.test.ts' },
  'base/EmptyState': [
    holds(EmptyState, 'says what is missing and what to do', { props: { title: 'No tables yet' }, slots: { default: () => 'Drop some.', action: () => h('button', 'Choose files') } }, ({ find, has }) => {
      expect(find('h2').text()).toBe('No tables yet')
      expect(find('p').text()).toBe('Drop some.')
      expect(has('Choose files')).toBe(true)
    }),
  ],
  'base/LinkButton': [
    holds(LinkButton, 'is a link', { props: { to: '/methods', tone: 'main' }, slots: { default: () => 'Methods' } }, ({ control }) => {
      expect(control('Methods').attributes('href')).toBe('/methods')
    }),
  ],
  'base/NumberField': { test: 'tests/nuxt/base/NumberField.test.ts' },
  'base/ProgressBar': [
    holds(ProgressBar, 'tells how far it is in numbers', { props: { label: 'Reading', share: 0.417 } }, ({ find, text }) => {
      expect(text()).toBe('Reading42 %')
      expect(find('[role=progressbar]').attributes()).toMatchObject({ 'aria-valuenow': '42', 'aria-label': 'Reading' })
    }),
  ],
  'base/SelectField': [
    holds(SelectField, 'gives back the value itself, not its text', { props: { label: 'Side', choices: [{ value: 1, label: 'one' }, { value: null, label: 'none' }], modelValue: 1, error: 'Choose.' } }, async ({ control, emitted, fill }) => {
      expect(control('Side').attributes('aria-invalid')).toBe('true')
      await fill('Side', 'none')
      expect(emitted('update:modelValue')).toEqual([[null]])
    }),
  ],
  'base/SkipLink': [
    holds(SkipLink, 'leads past the head of the page', {}, ({ control }) => {
      expect(control('Skip to the content').attributes('href')).toBe('#content')
    }),
  ],
  'base/TextField': [
    holds(TextField, 'is one line', { props: { label: 'Name', modelValue: 'Ada', autocomplete: 'name' } }, async ({ control, fill, emitted }) => {
      expect(control('Name').attributes()).toMatchObject({ type: 'text', autocomplete: 'name' })
      await fill('Name', 'Eve')
      expect(emitted('update:modelValue')).toEqual([['Eve']])
    }),
    holds(TextField, 'is several lines where asked', { props: { label: 'Remark', modelValue: '', rows: 3, error: 'Too long.' } }, ({ control, text }) => {
      expect(control('Remark').element.tagName).toBe('TEXTAREA')
      expect(control('Remark').attributes('aria-invalid')).toBe('true')
      expect(text()).toContain('Too long.')
    }),
  ],
}
