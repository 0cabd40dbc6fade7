import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { DOMWrapper, flushPromises } from '@vue/test-utils'
import { readBody, setResponseStatus } from 'h3'
import { expect, vi } from 'vitest'
import { defineComponent, h, shallowReactive } from 'vue'
import { provideStudy } from '~/composables/useStudy'
import { can, roles as allRoles } from '#shared/permissions'
import { initialView } from '~/utils/benchView'
import type { Answer, AskedRequest, ComponentCase, Seen } from './componentCase'
import { inventedStudy } from './inventedStudy'
import { controls, faultsOfPage, nameOf, pageText } from './soundPage'

/** What the server says where it refuses, with the sentence for a field. */
export const refusal = (message: string, field?: string) => new Refusal(message, field ? [{ field, sentence: message }] : [])
class Refusal {
  constructor(readonly message: string, readonly issues: { field: string, sentence: string }[]) {}
}

/** Mounts the component of a case with nothing around it but its study, and looks at it; every fault of the page and every word on the console fails. */
export async function seeCase(one: ComponentCase, went: unknown[]) {
  const said = (['warn', 'error'] as const).map(name => vi.spyOn(console, name).mockImplementation(() => {}))
  const wordsSaid = () => said.flatMap(({ mock }) => mock.calls.map(([first]) => String(first)))
  const asked: AskedRequest[] = []
  const person = { id: 'p1', name: 'Ada Moss', signInName: 'ada', roles: one.roles ?? [...allRoles], benchKeys: true }
  const silence = Object.entries({ '/api/me': { person, demo: false, first: false }, ...one.answers }).map(([address, answer]) => answerAt(address, answer, asked))
  clearNuxtData()
  clearNuxtState()
  localStorage.clear()
  useBenchStore().show(initialView())
  let refreshed = 0
  const props = shallowReactive({ ...one.props })
  const Host = defineComponent({
    setup() {
      provideStudy(computed(() => ({ ...inventedStudy, ...one.study })), async () => void refreshed++, action => can(person, action))
      return () => [h(one.component, { ...props }, one.slots as Record<string, () => unknown> | undefined), one.beside?.()]
    },
  })
  const host = await mountSuspended(Host, { attachTo: document.body })
  try {
    const part = host.findComponent(one.component)
    await settle()
    expect([...faultsOfPage(), ...wordsSaid()]).toEqual([])
    const change = async (next: Record<string, unknown>) => {
      Object.assign(props, next)
      await settle()
    }
    await one.look({ part, change, asked, went, refreshed: () => refreshed, emitted: name => part.emitted(name) ?? [], ...hands() })
    await settle()
    expect([...faultsOfPage(), ...wordsSaid()]).toEqual([])
  }
  finally {
    host.unmount()
    await settle()
    document.body.replaceChildren()
    for (const stop of silence) stop()
    for (const spy of said) spy.mockRestore()
  }
}

function answerAt(address: string, answer: Answer, asked: AskedRequest[]) {
  const [path = '', method = 'GET'] = address.split(' ').reverse()
  return registerEndpoint(path, {
    method: method as 'GET',
    handler: async (event) => {
      const request = { method, path, body: method === 'GET' || method === 'DELETE' ? null : await readBody(event) as unknown }
      asked.push(request)
      const given = typeof answer === 'function' ? (answer as (asked: AskedRequest) => unknown)(request) : answer
      if (!(given instanceof Refusal)) return given
      setResponseStatus(event, 400)
      return { message: given.message, data: { issues: given.issues } }
    },
  })
}

async function settle() {
  for (let turn = 0; turn < 3; turn++) {
    await flushPromises()
    await new Promise(resolve => setTimeout(resolve))
  }
}

function hands(): Pick<Seen, 'text' | 'control' | 'has' | 'find' | 'press' | 'fill' | 'send' | 'until'> {
  const named = (name: string | RegExp) => controls().filter(each => typeof name === 'string' ? nameOf(each) === name : name.test(nameOf(each)))
  const only = (found: HTMLElement[], what: string) => {
    const [first] = found
    if (!first || found.length > 1) throw new Error(`${found.length} elements are ${what}. Controls: ${controls().map(each => `“${nameOf(each)}”`).join(', ')}`)
    return new DOMWrapper(first)
  }
  const control = (name: string | RegExp) => only(named(name), `controls called ${name}`)
  const find = (selector: string) => only([...document.querySelectorAll<HTMLElement>(selector)], selector)
  return {
    text: pageText,
    control,
    find,
    has: name => named(name).length > 0,
    press: async (name) => {
      await control(name).trigger('click')
      await settle()
    },
    fill: async (name, value) => {
      const field = control(name)
      const choice = field.findAll('option').find(each => each.text() === value)
      if (choice) await choice.setValue()
      else await field.setValue(value)
      await settle()
    },
    send: async () => {
      await find('form').trigger('submit')
      await settle()
    },
    until: check => vi.waitFor(check, { timeout: 20_000 }),
  }
}
