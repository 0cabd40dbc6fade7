import { sampleComponents } from '#shared/science/components/sampleComponents'
import type { ComponentsReport, ComponentsWork } from '~/utils/componentsWork'

/**
 * Computes principal components beside the page, which answers meanwhile. The intensities come once; later runs only say
 * which samples and features. What fails ends in the page's `onerror`.
 */
let intensity: readonly Float64Array[] = []

self.onmessage = ({ data }: MessageEvent<ComponentsWork>) => {
  if (data.intensity) intensity = data.intensity
  const { run, ask: { samples, ...rest } } = data
  const report = (message: ComponentsReport) => self.postMessage(message)
  const own = samples.map(sample => intensity[sample] ?? new Float64Array(0))
  const result = sampleComponents({ ...rest, intensity: own }, (share, what) => report({ run, share, what }))
  report({ run, result })
}
