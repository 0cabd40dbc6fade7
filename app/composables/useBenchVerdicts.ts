import { CannotCompare } from '#shared/science/normalisation/cannotCompare'
import { decideVerdicts } from '#shared/science/verdict/decideVerdicts'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { SideSummary } from '#shared/science/verdict/sideSummary'
import { summariseSides } from '#shared/science/verdict/summariseSides'
import type { ComparisonData } from '#shared/formats/comparisonData'
import type { VerdictResult } from '#shared/science/verdict/verdictResult'
import type { BenchSource } from '~/utils/benchSource'

/** Lets the plot and the first rows be drawn before more is read. */
const idle = () => new Promise<void>(resolve => 'requestIdleCallback' in window ? window.requestIdleCallback(() => resolve(), { timeout: 1000 }) : setTimeout(resolve, 200))

/**
 * The verdicts a bench shows: those saved with the version, or a preview under other limits, made by the same functions the
 * server uses. Loaded in the browser only; the intensities follow when the verdicts stand.
 */
export function useBenchVerdicts(source: () => BenchSource) {
  const saved = shallowRef<VerdictResult | null>(null)
  const data = shallowRef<ComparisonData | null>(null)
  const problem = ref('')
  const previewProblem = ref('')
  const preview = shallowRef<{ settings: ComparisonSettings, result: VerdictResult } | null>(null)
  let summary: SideSummary | null = null

  async function load() {
    const asked = source()
    const isStill = () => source().version === asked.version
    saved.value = data.value = preview.value = summary = null
    problem.value = ''
    try {
      const verdicts = await asked.loadVerdicts()
      if (isStill()) saved.value = verdicts
      await idle()
      if (!isStill()) return
      const loaded = await asked.loadData?.() ?? null
      if (isStill()) data.value = loaded
    }
    catch (error) {
      if (isStill()) problem.value = toProblem(error).message
    }
  }
  onMounted(load)
  watch(() => source().version, load)

  /** Judges anew under these settings, unsaved; null goes back to what is saved. */
  function previewWith(settings: ComparisonSettings | null) {
    previewProblem.value = ''
    preview.value = null
    if (!settings || !data.value) return
    try {
      const { normaliseByAmount } = settings
      if (summary?.normaliseByAmount !== normaliseByAmount) summary = summariseSides({ ...data.value, normaliseByAmount })
      preview.value = { settings, result: decideVerdicts(summary, settings) }
    }
    catch (error) {
      if (!(error instanceof CannotCompare)) throw error
      previewProblem.value = error.message
    }
  }

  return {
    saved, data, preview, previewProblem, problem, previewWith,
    result: computed(() => preview.value?.result ?? saved.value),
    settings: computed(() => preview.value?.settings ?? source().version.settings),
    names: computed(() => ({ a: source().version.sideAName, b: source().version.sideBName })),
  }
}
