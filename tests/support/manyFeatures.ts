import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { comparisonDefaults, type ComparedSample, type ComparisonSettings } from '../../shared/science/verdict/settings'
import type { SideInput } from '../../shared/science/verdict/sideSummary'
import { summariseSides } from '../../shared/science/verdict/summariseSides'
import { seededRandom } from './seededRandom'

/** An aligned study of invented numbers: `perSide` preparations a side and two blanks; every kind of verdict occurs. */
export function manyFeatures(features: number, { perSide = 3, seed = 7 } = {}): SideInput {
  const { uniform: random, normal } = seededRandom(seed)
  const sample = (name: string, rest: Partial<ComparedSample>): ComparedSample => ({
    id: name, name, kind: 'sample', side: null, preparation: name, amount: 100, amountUnit: 'mg', volumeMl: 1, dilution: 1, injectionUl: 2,
    runOrder: null, batch: null, floor: 2000, floorSource: 'stated', gapFilled: false, measure: 'area', ...rest,
  })
  const samples = [
    ...Array.from({ length: perSide }, (_, i) => sample(`M${i + 1}`, { side: 'A' })),
    ...Array.from({ length: perSide }, (_, i) => sample(`T${i + 1}`, { side: 'B' })),
    sample('blank 1', { kind: 'solventBlank', amount: null }),
    sample('blank 2', { kind: 'solventBlank', amount: null }),
  ]
  const intensity = samples.map(() => new Float64Array(features).fill(Number.NaN))
  const mz = new Float64Array(features)
  const retentionMinutes = new Float64Array(features)
  for (let i = 0; i < features; i++) {
    mz[i] = 80 + 920 * random()
    retentionMinutes[i] = 0.3 + 19 * random()
    const level = 2000 * 10 ** (3 * random())
    const kind = random()
    const shift = kind < 0.15 ? 3 * normal() : kind < 0.5 ? 0.1 * normal() : 0.6 * normal()
    const onlyA = kind > 0.9 && kind < 0.93
    const onlyB = kind > 0.93 && kind < 0.95
    samples.forEach((each, s) => {
      const column = intensity[s]
      if (!column) return
      if (each.kind !== 'sample') {
        if (kind > 0.95 || random() < 0.1) column[i] = level * (kind > 0.95 ? 0.8 : 0.02)
        return
      }
      const absent = (each.side === 'A' && onlyB) || (each.side === 'B' && onlyA) || random() < 0.03
      const value = level * 2 ** ((each.side === 'B' ? shift : 0) + 0.15 * normal())
      if (!absent && value > each.floor) column[i] = value
    })
  }
  return { samples, intensity, mz, retentionMinutes, neighbourStart: new Int32Array(features + 1), neighbourList: new Int32Array(0), normaliseByAmount: true }
}

/** The same, judged. */
export function manyVerdicts(features: number, options: { perSide?: number, seed?: number, settings?: Partial<ComparisonSettings> } = {}) {
  const input = manyFeatures(features, options)
  const settings = { ...comparisonDefaults, ...options.settings }
  const summary = summariseSides(input)
  return { input, settings, summary, result: decideVerdicts(summary, settings) }
}
