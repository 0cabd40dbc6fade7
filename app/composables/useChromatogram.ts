import type { ComparisonData } from '#shared/formats/comparisonData'
import { withKnownFloor } from '#shared/formats/comparisonData'
import type { ExtractedTrace, SampleTrace } from '#shared/formats/traceColumns'
import { MOST_EXTRACTED } from '#shared/schemas/comparison'
import { chooseSamples } from '#shared/science/verdict/chooseSamples'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import { drawnSamples, linesFromFeatures, type SampleLine } from '~/charts/chromatogramCurves'
import type { BenchSource } from '~/utils/benchSource'
import type { TraceOrigin } from '~/utils/traceView'

/** Extracted traces are kept of so many features. */
const MOST_KEPT = 120
/** Moving through the table does not ask for each feature on the way. */
const REST_MS = 150
/** Longer work lets the page draw in between. */
const FRAME_MS = 12

const pause = (ms: number) => new Promise<void>(resolve => setTimeout(resolve, ms))

/** The traces the chromatogram draws, of every compared sample: loaded or drawn from features, and only once it is in view. */
export function useChromatogram(source: () => BenchSource, data: () => ComparisonData | null, settings: () => ComparisonSettings, inView: () => boolean) {
  const bench = useBenchStore()
  /** Null: not loaded yet. */
  const traces = shallowRef<readonly SampleTrace[] | null>(null)
  const lines = shallowRef<readonly SampleLine[]>([])
  const waiting = ref(true)
  const problem = ref('')
  const kept = new Map<number, ExtractedTrace[]>()

  const samples = computed(() => {
    const all = source().version.samples.map(withKnownFloor)
    return drawnSamples(all, chooseSamples(all, settings().normaliseByAmount).factor)
  })
  const hasTraces = computed(() => samples.value.some(({ position }) => traces.value?.some(trace => trace.position === position)))
  const origin = computed((): TraceOrigin => hasTraces.value ? bench.traceOrigin : 'features')
  const withoutTrace = computed(() => origin.value === 'features' ? [] : samples.value.filter(({ position }) => !traces.value?.some(trace => trace.position === position)).map(({ sampleName }) => sampleName))
  /** An address may name features that this alignment does not have. */
  const extracted = computed(() => {
    const aligned = Object.values(source().version.counts).reduce((sum, count) => sum + count, 0)
    return bench.looked.filter(feature => feature < aligned).slice(0, MOST_EXTRACTED)
  })

  async function loadTraces(from: BenchSource): Promise<readonly SampleTrace[]> {
    const loaded = await from.loadTraces?.() ?? []
    kept.clear()
    return loaded
  }
  async function loadExtracted(from: BenchSource, features: readonly number[], isStill: () => boolean) {
    if (kept.size + features.length > MOST_KEPT) kept.clear()
    const missing = features.filter(feature => !kept.has(feature))
    if (missing.length === 0 || !from.loadExtracted) return
    await pause(REST_MS)
    if (!isStill()) return
    const loaded = await from.loadExtracted(missing)
    for (const feature of missing) kept.set(feature, loaded.filter(trace => trace.feature === feature))
  }

  function measuredLines(features: readonly number[]): SampleLine[] {
    const { traceKind } = bench
    return samples.value.flatMap(({ position, ...sample }): SampleLine[] => {
      if (traceKind === 'extracted') return features.flatMap(feature => kept.get(feature)?.filter(trace => trace.position === position).map(({ minutes, values }) => ({ ...sample, feature, minutes, values })) ?? [])
      const trace = traces.value?.find(each => each.position === position)
      return trace ? [{ ...sample, feature: null, minutes: trace.minutes, values: trace[traceKind] }] : []
    })
  }
  async function drawnLines(features: readonly number[], isStill: () => boolean): Promise<SampleLine[]> {
    const drawn: SampleLine[] = []
    const shown = data()
    let began = performance.now()
    for (const sample of shown ? samples.value : []) {
      if (performance.now() - began > FRAME_MS) {
        await pause(0)
        if (!isStill()) return []
        began = performance.now()
      }
      if (shown) drawn.push(...linesFromFeatures(sample, shown, bench.traceKind, features))
    }
    return drawn
  }

  let asked = 0
  async function refresh() {
    const own = ++asked
    const isStill = () => own === asked
    if (!inView()) return
    const from = source()
    const features = extracted.value
    problem.value = ''
    try {
      if (traces.value === null) {
        const loaded = await loadTraces(from)
        if (!isStill()) return
        traces.value = loaded
        return
      }
      if (origin.value === 'measured' && bench.traceKind === 'extracted') await loadExtracted(from, features, isStill)
      if (!isStill()) return
      const next = origin.value === 'measured' ? measuredLines(features) : await drawnLines(features, isStill)
      if (!isStill()) return
      lines.value = next
      waiting.value = origin.value === 'features' && data() === null
    }
    catch (error) {
      if (isStill()) problem.value = toProblem(error).message
    }
  }
  watch(() => source().version, () => {
    traces.value = null
    lines.value = []
    waiting.value = true
  })
  watch([inView, traces, () => source().version, samples, data, origin, () => bench.traceKind, () => bench.traceKind === 'extracted' ? extracted.value.join() : ''], refresh, { immediate: true })
  onScopeDispose(() => asked++)

  return { lines, waiting, problem, origin, hasTraces, withoutTrace, extracted }
}
