import type { SampleComponents } from '#shared/science/components/sampleComponents'
import type { ComponentsAsk, ComponentsReport, ComponentsWork } from '~/utils/componentsWork'

const STOPPED = 'The principal components could not be computed: the browser stopped the computing, perhaps for want of memory. Let fewer samples or features take part, or load the page again.'

/**
 * Principal components of the intensities, computed by a worker in the browser. A run that is no longer asked for is ended; what
 * was found last stays, with what was asked for it, until the next is there. Call where nothing is rendered by the server.
 */
export function useComponents<Asked extends { work: ComponentsAsk }>(intensity: () => readonly Float64Array[], ask: () => Asked) {
  const found = shallowRef<{ asked: Asked, result: SampleComponents } | null>(null)
  const progress = ref<{ share: number, what: string } | null>(null)
  const problem = ref('')
  let worker: Worker | null = null
  let held: readonly Float64Array[] | null = null
  let run = 0

  /** What a worker still says after its end is not heard. */
  function end() {
    run++
    worker?.terminate()
    worker = held = progress.value = null
  }

  function begin(asked: Asked) {
    // A worker hears nothing while it computes, so one that is busy is ended.
    if (progress.value) end()
    problem.value = ''
    progress.value = { share: 0, what: 'Starting' }
    const own = ++run
    worker ??= new Worker(new URL('../workers/components.ts', import.meta.url), { type: 'module' })
    worker.onmessage = ({ data }: MessageEvent<ComponentsReport>) => {
      if (data.run !== run) return
      if ('result' in data) {
        progress.value = null
        found.value = { asked, result: data.result }
      }
      else progress.value = { share: data.share, what: data.what }
    }
    worker.onerror = () => {
      if (own !== run) return
      end()
      found.value = null
      problem.value = STOPPED
    }
    const values = intensity()
    const work: ComponentsWork = { ask: asked.work, run: own, intensity: values === held ? null : values }
    held = values
    worker.postMessage(work)
  }

  watch(ask, begin, { immediate: true })
  onScopeDispose(end)
  return { found, progress, problem }
}
