import { expect } from 'vitest'
import DivertWindows from '~/components/method/DivertWindows.vue'
import MethodFields from '~/components/method/MethodFields.vue'
import MethodForm from '~/components/method/MethodForm.vue'
import MethodItem from '~/components/method/MethodItem.vue'
import { emptyMethod } from '~/utils/emptyMethod'
import { holds, type ComponentRows } from './componentCase'
import { inventedMethod } from './inventedStudy'
import { refusal } from './mountCase'

const nothing = () => undefined

export const methodRows: ComponentRows = {
  'method/DivertWindows': [
    holds(DivertWindows, 'adds a window from the start of the run, and takes one away', { props: { modelValue: [], issue: nothing } }, async ({ press, emitted, has, find }) => {
      expect(find('legend').text()).toBe('Sent to waste')
      await press('Add a window')
      expect(emitted('update:modelValue')).toEqual([[[{ startMinutes: 0, endMinutes: null }]]])
      await press('Take away window 1')
      expect(has('Take away window 1')).toBe(false)
    }),
    holds(DivertWindows, 'takes ten windows and no more, and says which time is wrong', {
      props: { modelValue: Array.from({ length: 10 }, (_, i) => ({ startMinutes: i, endMinutes: i })), issue: (field: string) => field === 'divertWindows.3.endMinutes' ? 'The end must lie after the start.' : undefined },
    }, ({ control }) => {
      expect(control('Add a window').attributes('disabled')).toBe('')
      const wrong = document.querySelectorAll('[aria-invalid=true]')
      expect([...wrong].map(each => each.closest('[role=group]')?.getAttribute('aria-label'))).toEqual(['Window 4'])
    }),
  ],
  'method/MethodFields': [
    holds(MethodFields, 'has a field for each part of a method, and says what is wrong with one', { props: { modelValue: emptyMethod(), issue: (field: string) => field === 'polarity' ? 'Choose negative or positive.' : undefined } }, ({ control, text }) => {
      for (const name of ['Name of the method', 'Polarity', 'Void time', 'Column', 'Gradient', 'Remark']) expect(control(name).element).toBeTruthy()
      expect(control('Polarity').attributes('aria-invalid')).toBe('true')
      expect(text()).toContain('Choose negative or positive.')
    }),
  ],
  'method/MethodForm': [
    holds(MethodForm, 'makes a method', { answers: { 'POST /api/methods': { id: 'm2' } } }, async ({ fill, send, asked, emitted, until }) => {
      await fill('Name of the method', 'HILIC')
      await fill('Polarity', 'positive')
      await fill('Void time', '0,9')
      await send()
      await until(() => expect(emitted('saved')).toHaveLength(1))
      expect(asked.at(-1)?.body).toMatchObject({ name: 'HILIC', polarity: 'positive', voidMinutes: 0.9 })
    }),
    holds(MethodForm, 'warns of the studies that a change reaches, and sends no more than the method', { props: { method: inventedMethod }, answers: { 'PATCH /api/methods/m1': refusal('Someone else uses this name.', 'name') } }, async ({ find, send, asked, control, press, emitted, until }) => {
      expect(find('[role=note]').text()).toContain('A study uses this method: Two mills.')
      await send()
      await until(() => expect(control('Name of the method').attributes('aria-invalid')).toBe('true'))
      expect(Object.keys(asked.at(-1)?.body as object).sort()).toEqual(['column', 'divertWindows', 'gradient', 'name', 'polarity', 'remark', 'voidMinutes'])
      await press('Cancel')
      expect([emitted('saved').length, emitted('cancel').length]).toEqual([0, 1])
    }),
  ],
  'method/MethodItem': [
    holds(MethodItem, 'says what it is and who uses it', { props: { method: inventedMethod, editable: true } }, async ({ text, control, press, emitted }) => {
      expect(text()).toContain('Sent to waste0 to 0.7 min')
      expect(text()).not.toContain('Remark')
      expect(control('Two mills').attributes('href')).toBe('/studies/s1')
      await press('Edit RP 15 min')
      expect(emitted('edit')).toHaveLength(1)
    }),
    holds(MethodItem, 'is only read by those who may not edit it', { props: { method: { ...inventedMethod, studies: [] }, editable: false } }, ({ text, has }) => {
      expect(text()).toContain('no study that you see')
      expect(has(/Edit/)).toBe(false)
    }),
  ],
}
