import { mockNuxtImport, mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { defineComponent, h } from 'vue'
import BenchKeysHelp from '~/components/comparison/BenchKeysHelp.vue'
import BenchKeysField from '~/components/person/BenchKeysField.vue'
import { isSingleKey, useBenchKeys, type BenchKey } from '~/composables/useBenchKeys'

const me = (benchKeys: boolean) => ({ person: { id: 'a', name: 'Ada', signInName: 'ada', roles: ['analyst'], benchKeys }, demo: false, first: false })
const asked = vi.hoisted(() => ({ me: null as unknown }))
mockNuxtImport('useNuxtData', () => () => ({ data: ref(asked.me) }))
const signedIn = (state: ReturnType<typeof me> | null) => { asked.me = state }
beforeEach(() => {
  signedIn(null)
  useCookie('steelyard-bench-keys').value = null
})

async function pressed(singleKeysAct: boolean, keys: string[]): Promise<string[]> {
  const acted: string[] = []
  const bench = await mountSuspended(defineComponent({
    setup() {
      const own = ['j', '?', '7', '/', 'ArrowDown', 'Escape'].map((key): BenchKey => ({ key, says: key, act: () => void acted.push(key) }))
      const { onKey } = useBenchKeys(own, () => singleKeysAct)
      return () => h('div', { onKeydown: onKey }, h('input'))
    },
  }))
  for (const key of keys) await bench.trigger('keydown', { key })
  await bench.get('input').trigger('keydown', { key: 'j' })
  return acted
}

describe('keys of the bench', () => {
  it('act, but not while somebody types', async () => {
    expect(await pressed(true, ['j', '?', 'ArrowDown'])).toEqual(['j', '?', 'ArrowDown'])
  })

  it('put off, leave arrows and Esc, which are no character keys', async () => {
    expect(await pressed(false, ['j', '?', '7', '/', 'ArrowDown', 'Escape'])).toEqual(['ArrowDown', 'Escape'])
    expect(['j', '€', '🙂'].map(isSingleKey)).toEqual([true, true, true])
  })
})

describe('the help with keys', () => {
  const keys: BenchKey[] = [{ key: 'j', says: 'next feature', act: () => undefined }, { key: 'Escape', says: 'clear', act: () => undefined }]
  const shown = async () => {
    await mountSuspended(BenchKeysHelp, { props: { keys, open: true } })
    return [...document.body.querySelectorAll('[role=dialog]')].at(-1)
  }

  it('gives a guest a switch that this browser keeps', async () => {
    const dialog = await shown()
    expect(dialog?.textContent).toContain('next feature')
    const box = dialog?.querySelector<HTMLInputElement>('input[type=checkbox]')
    expect(box?.checked).toBe(true)
    box?.click()
    await nextTick()
    expect(useCookie('steelyard-bench-keys').value).toBe('off')
    expect(dialog?.textContent).not.toContain('next feature')
    expect(dialog?.textContent).toContain('arrows and Esc go on')
  })

  it('sends a person to the profile', async () => {
    signedIn(me(false))
    const dialog = await shown()
    expect(dialog?.querySelector('input')).toBeNull()
    expect(dialog?.querySelector('a')?.getAttribute('href')).toBe('/profile')
    expect(dialog?.textContent).not.toContain('next feature')
  })
})

describe('the switch in the profile', () => {
  it('is saved at once', async () => {
    const sent: unknown[] = []
    registerEndpoint('/api/me', { method: 'PATCH', handler: async (event) => {
      const { readBody } = await import('h3')
      sent.push(await readBody(event))
      return { name: 'Ada', benchKeys: false }
    } })
    registerEndpoint('/api/me', { method: 'GET', handler: () => me(false) })
    const field = await mountSuspended(BenchKeysField, { props: { on: true } })
    await field.get('input').setValue(false)
    await expect.poll(() => field.get('[role=status]').text()).toBe('Saved: off.')
    expect(sent).toEqual([{ benchKeys: false }])
  })
})
