import { sampleComponents } from '../../shared/science/components/sampleComponents'
import { seededRandom } from '../support/seededRandom'

/** Prints how long the principal components of samples take, the way their worker computes them; one missing value in ten. */
export function benchComponents(): void {
  for (const [samples, features] of [[30, 20_000], [100, 10_000], [100, 50_000]] as const) {
    const { uniform, normal } = seededRandom(samples + features)
    const intensity = Array.from({ length: samples }, () => Float64Array.from({ length: features }, () => uniform() < 0.1 ? Number.NaN : 2 ** (14 + 2 * normal())))
    const ask = { intensity, factors: new Float64Array(samples).fill(1), features: Int32Array.from({ length: features }, (_, i) => i), scaling: 'unitVariance', most: 5 } as const
    const seconds = Array.from({ length: 3 }, () => {
      const start = performance.now()
      sampleComponents(ask)
      return (performance.now() - start) / 1000
    })
    console.log(`  ${samples} samples × ${features} features: ${seconds.map(each => each.toFixed(2)).join(', ')} s`)
  }
}
