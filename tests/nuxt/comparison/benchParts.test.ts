import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it } from 'vitest'
import BalanceBar from '~/components/comparison/BalanceBar.vue'
import FeatureCard from '~/components/comparison/FeatureCard.vue'
import SettingsPanel from '~/components/comparison/SettingsPanel.vue'
import { VERDICT } from '#shared/science/verdict/verdicts'
import { initialView } from '~/utils/benchView'
import { manyVerdicts } from '../../support/manyFeatures'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const many = manyVerdicts(500)
beforeEach(() => useBenchStore().show(initialView()))

describe('the balance bar', () => {
  it('filters by a part and says that it does', async () => {
    const bar = await mountSuspended(BalanceBar, { props: { counts: many.result.counts, names, foldLimit: 1 } })
    const part = bar.findAll('button').find(button => button.text().includes('found only in Tallow Lane'))
    expect(part?.text()).toContain(String(many.result.counts.onlyB))
    await part?.trigger('click')
    expect(useBenchStore().verdicts).toEqual(['onlyB'])
    expect(part?.attributes('aria-pressed')).toBe('true')
  })

  it('shows what a preview moves', async () => {
    const before = { ...many.result.counts, onlyA: 1000 }
    const bar = await mountSuspended(BalanceBar, { props: { counts: many.result.counts, before, names, foldLimit: 1 } })
    expect(bar.text()).toContain(`1\u202F000 → ${many.result.counts.onlyA}`)
  })
})

describe('the feature card', () => {
  it('gives the verdict in words, its reason with numbers, and values per sample', async () => {
    const feature = many.result.columns.verdict.indexOf(VERDICT.onlyA)
    const card = await mountSuspended(FeatureCard, { props: { feature, result: many.result, data: many.input, settings: many.settings, names } })
    expect(card.text()).toContain('found only in Millrace')
    expect(card.text()).toMatch(/It stands ×[\d.]+ above the highest floor of Tallow Lane/)
    expect(card.get('[role=img]').attributes('aria-label')).toContain('Tallow Lane: found in 0 of 3')
  })

  it('never prints what is no number', async () => {
    for (let feature = 0; feature < 60; feature++) {
      const card = await mountSuspended(FeatureCard, { props: { feature, result: many.result, data: null, settings: many.settings, names } })
      expect(card.text()).not.toMatch(/NaN|Infinity|undefined/)
    }
  })
})

describe('the settings panel', () => {
  const props = { saved: many.settings, mayPreview: true, maySave: true, busy: false, problem: '', draft: null }

  it('passes a changed limit on as a draft and offers to save it', async () => {
    const panel = await mountSuspended(SettingsPanel, { props })
    const fold = panel.findAll('label').find(label => label.text() === 'Fold limit')
    await panel.get(`[id="${fold?.attributes('for')}"]`).setValue('4')
    expect(panel.emitted('update:draft')?.at(-1)).toEqual([{ ...many.settings, foldLimit: 2 }])
  })

  it('keeps a wrong value to itself, with the range', async () => {
    const panel = await mountSuspended(SettingsPanel, { props })
    const alpha = panel.findAll('label').find(label => label.text() === 'Alpha')
    await panel.get(`[id="${alpha?.attributes('for')}"]`).setValue('7')
    expect(panel.emitted('update:draft')).toBeUndefined()
    expect(panel.text()).toContain('From 0.000001 to 0.5.')
  })

  it('has no save where the person may not', async () => {
    const panel = await mountSuspended(SettingsPanel, { props: { ...props, maySave: false } })
    expect(panel.text()).not.toContain('Save as a new version')
  })
})
