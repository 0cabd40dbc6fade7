import type { DemoState } from '../../shared/types/demo'
import { makeDemo } from '../domain/demo/makeDemo'
import { publicFileNames, publicTraceNames } from '../domain/demo/publicFiles'
import type { Laboratory } from './laboratory'

const state: Omit<DemoState, 'files' | 'traceFiles'> = { making: false, now: '', problem: null }
const stopping = new AbortController()
let made: Promise<void> = Promise.resolve()

/** Begins or goes on making the demo laboratory, beside the requests. */
export function startDemo({ db, folder, jobs }: Laboratory) {
  state.making = true
  made = makeDemo({ db, folder, jobs }, (now) => { state.now = now }, stopping.signal)
    .catch((error: Error) => {
      if (stopping.signal.aborted) return
      console.error('[demo]', error)
      state.problem = 'The demo laboratory could not be made whole. It is tried again at the next start.'
    })
    .finally(() => { state.making = false })
}

/** Lets it end where it is; the next start goes on. */
export async function stopDemo() {
  stopping.abort()
  await made
}

export const demoState = (): DemoState => ({ ...state, files: publicFileNames, traceFiles: publicTraceNames })
