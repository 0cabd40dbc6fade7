import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import DemoBeingMade from '~/components/study/DemoBeingMade.vue'

const state = { making: true, now: 'Aligning the tables of study 1 of 3', problem: null as string | null, files: [], traceFiles: [] }
registerEndpoint('/api/demo', () => ({ ...state }))

beforeEach(() => vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval'] }))
afterEach(() => vi.useRealTimers())

it('says what is being made, tells when more stands, and falls silent at the end', async () => {
  const notice = await mountSuspended(DemoBeingMade)
  expect(notice.text()).toContain('The demo laboratory is being made. Aligning the tables of study 1 of 3')
  expect(notice.emitted('more')).toBeUndefined()
  state.making = false
  await vi.advanceTimersByTimeAsync(1500)
  await vi.waitFor(() => expect(notice.emitted('more')).toHaveLength(1), 30_000)
  expect(notice.text()).toBe('')
})
