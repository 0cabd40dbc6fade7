import { meanInjectedSignal } from '../normalisation/blankCheck'
import { studentQuantileOf } from '../statistics/studentQuantile'
import { welch } from '../statistics/welch'
import { chooseSamples } from './chooseSamples'
import { groupPreparations } from './preparations'
import type { SideInput, SideSummary, SummarisedSide } from './sideSummary'
import { preparationLog2, sideStatistics, type SideStatistics } from './sideStatistics'
import { sideTraces } from './sideTraces'

/**
 * First of two stages: normalises, averages injections of one preparation in log2, and gathers per feature
 * what no limit changes. The order of the samples does not matter; swapping the sides mirrors the result.
 * @throws CannotCompare where a side has nothing to compare, or amounts in mg and mL are mixed
 */
export function summariseSides(input: SideInput): SideSummary {
  const features = input.mz.length
  const { samples, intensity } = input
  const { blanks, compared, ...chosen } = chooseSamples(samples, input.normaliseByAmount)
  const preparations = groupPreparations(samples, compared)
  const column = (index: number) => intensity[index] ?? new Float64Array(features).fill(Number.NaN)
  const injections = { A: new Uint16Array(features), B: new Uint16Array(features) }
  const log2 = preparations.map(({ side, injections: positions }) =>
    preparationLog2(positions.map(index => ({ intensity: column(index), factor: chosen.factor[index] ?? Number.NaN })), injections[side]))
  const blankPerUl = [...blanks, ...compared].every(index => samples[index]?.injectionUl)
  const signalOf = (positions: number[]) => meanInjectedSignal(
    positions.map(index => ({ intensity: column(index), injectionUl: samples[index]?.injectionUl ?? null })), features, blankPerUl)
  const sideOf = (side: 'A' | 'B'): SummarisedSide => {
    const own = preparations.filter(preparation => preparation.side === side)
    const positions = own.flatMap(preparation => preparation.injections)
    const statistics = sideStatistics(log2.filter((_, p) => preparations[p]?.side === side), injections[side])
    return {
      ...statistics,
      preparations: own.length,
      injectedSignal: chosen.blankKind ? signalOf(positions) : new Float64Array(features).fill(Number.NaN),
      blankScale: Math.max(...positions.map(index => (chosen.factor[index] ?? Number.NaN) * (blankPerUl ? samples[index]?.injectionUl ?? 1 : 1))),
      neighbour: strongestNeighbour(statistics, input),
      traces: sideTraces(own, chosen.factor, input.traceMaxima ?? [], features),
      allHeights: positions.every(index => samples[index]?.measure === 'height'),
    }
  }
  const a = sideOf('A')
  const b = sideOf('B')
  return {
    features,
    samples,
    mz: input.mz,
    retentionMinutes: input.retentionMinutes,
    normaliseByAmount: input.normaliseByAmount,
    ...chosen,
    preparations,
    log2,
    a,
    b,
    highestCounts: highestOf(samples.map((_, index) => column(index)), features),
    blankSignal: signalOf(canonical(blanks, samples)),
    blankPerUl,
    ...differences(a, b, features),
  }
}

function canonical(positions: number[], samples: SideInput['samples']): number[] {
  const key = (index: number) => `${samples[index]?.name ?? ''}\u0000${samples[index]?.id ?? ''}`
  return [...positions].sort((i, j) => key(i) < key(j) ? -1 : 1)
}

function highestOf(columns: Float64Array[], features: number): Float64Array {
  const highest = new Float64Array(features).fill(Number.NaN)
  for (const values of columns) {
    for (let i = 0; i < features; i++) if (!(highest[i]! >= values[i]!) && values[i]! > 0) highest[i] = values[i]!
  }
  return highest
}

function strongestNeighbour(side: SideStatistics, { neighbourStart, neighbourList, mz }: SideInput): Int32Array {
  const strongest = new Int32Array(mz.length).fill(-1)
  for (let i = 0; i < mz.length; i++) {
    let best = 0
    for (let k = neighbourStart[i]!; k < neighbourStart[i + 1]!; k++) {
      const neighbour = neighbourList[k]!
      if (side.highest[neighbour]! > best) {
        best = side.highest[neighbour]!
        strongest[i] = neighbour
      }
    }
  }
  return strongest
}

function differences(a: SideStatistics, b: SideStatistics, features: number) {
  const empty = () => new Float64Array(features).fill(Number.NaN)
  const result = { log2Ratio: empty(), standardError: empty(), degreesOfFreedom: empty(), p: empty(), low: empty(), high: empty() }
  const quantile95 = studentQuantileOf(0.95)
  for (let i = 0; i < features; i++) {
    if (a.detected[i] === 0 || b.detected[i] === 0) continue
    const test = welch(
      { n: a.detected[i]!, mean: a.mean[i]!, variance: a.variance[i]! },
      { n: b.detected[i]!, mean: b.mean[i]!, variance: b.variance[i]! })
    result.log2Ratio[i] = test.difference
    if (Number.isNaN(test.p)) continue
    result.standardError[i] = test.standardError
    result.degreesOfFreedom[i] = test.degreesOfFreedom
    result.p[i] = test.p
    const halfWidth = quantile95(test.degreesOfFreedom) * test.standardError
    result.low[i] = test.difference - halfWidth
    result.high[i] = test.difference + halfWidth
  }
  return result
}

