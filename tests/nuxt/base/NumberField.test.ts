import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import NumberField from '~/components/base/NumberField.vue'

it('takes a comma or a point; what is no number stays in the field, is said, and holds the form back', async () => {
  const field = await mountSuspended(NumberField, { props: { label: 'Time tolerance', unit: 'min', modelValue: 0.1 } })
  const input = field.get('input')
  await input.setValue('0,25')
  expect(field.emitted('update:modelValue')?.at(-1)).toEqual([0.25])
  expect((input.element as HTMLInputElement).validity.valid).toBe(true)
  await input.setValue('about 3')
  expect(field.emitted('update:modelValue')?.at(-1)).toEqual([0.25])
  expect(field.text()).toContain('Not a number')
  expect((input.element as HTMLInputElement).validity.valid).toBe(false)
  await input.setValue('3')
  expect((input.element as HTMLInputElement).validity.valid).toBe(true)
})
