import { describe, expect, it } from 'vitest'
import { isDefault, sameSettings, settingFields } from '../../../app/utils/settingFields'
import { comparisonSettingsSchema } from '../../../shared/schemas/comparison'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'

describe('the limits as fields', () => {
  it.each(settingFields.map(field => [field.label, field] as const))('%s: what is shown sets the same again, and its default is named', (_, field) => {
    expect(isDefault(field, comparisonDefaults)).toBe(true)
    const again = { ...comparisonDefaults, ...field.set(field.shown(comparisonDefaults)) }
    expect(sameSettings(again, comparisonDefaults)).toBe(true)
    expect(field.source).toMatch(/^Default/)
    expect(field.sentence(comparisonDefaults)).toMatch(/\.$/)
  })

  it.each(settingFields.map(field => [field.label, field] as const))('%s: refuses what the server would refuse', (_, field) => {
    for (const value of [-1, 0, 1e20]) {
      const part = field.set(value)
      if (part) expect(comparisonSettingsSchema.safeParse({ ...comparisonDefaults, ...part }).success).toBe(true)
    }
    expect(field.set(-1)).toBeUndefined()
  })

  it('thinks in ×, % and counts, and stores as the science has it', () => {
    const set = (id: string, value: number | null) => settingFields.find(field => field.id === id)?.set(value)
    expect(set('foldLimit', 4)).toEqual({ foldLimit: 2 })
    expect(set('presence', 50)).toEqual({ presence: 0.5 })
    expect(set('intensityLimit', null)).toEqual({ intensityLimit: null })
  })
})
