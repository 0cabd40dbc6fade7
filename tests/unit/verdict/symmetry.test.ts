import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { decideVerdicts } from '../../../shared/science/verdict/decideVerdicts'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import type { SideInput } from '../../../shared/science/verdict/sideSummary'
import { summariseSides } from '../../../shared/science/verdict/summariseSides'
import { MIRRORED, VERDICTS } from '../../../shared/science/verdict/verdicts'
import { comparisonInput, none, type Written } from '../../support/comparisonInput'

const FEATURES = 12
const intensity = fc.oneof({ weight: 1, arbitrary: fc.constant(none) }, { weight: 3, arbitrary: fc.double({ min: 20, max: 5000, noNaN: true }) })
const signal = fc.oneof({ weight: 1, arbitrary: fc.constantFrom(none, 0) }, { weight: 3, arbitrary: fc.double({ min: 1, max: 5000, noNaN: true }) })
const written = (side: 'A' | 'B' | null, kind: 'sample' | 'solventBlank', minLength: number) => fc.array(fc.record({
  values: fc.array(intensity, { minLength: FEATURES, maxLength: FEATURES }),
  preparation: fc.constantFrom('', 'one', 'two'),
  amount: fc.double({ min: 10, max: 40, noNaN: true }),
  floor: fc.double({ min: 10, max: 200, noNaN: true }),
  gapFilled: fc.boolean(),
  floorSource: fc.constantFrom('stated' as const, 'estimated' as const),
  measure: fc.constantFrom('area' as const, 'height' as const),
  trace: fc.option(fc.array(signal, { minLength: FEATURES, maxLength: FEATURES }), { nil: undefined }),
}), { minLength, maxLength: 4 }).map(rows => rows.map((row, i): Written => ({ ...row, side, kind, name: `${side ?? 'blank'}${i}` })))
const anySamples = fc.tuple(written('A', 'sample', 1), written('B', 'sample', 1), written(null, 'solventBlank', 0)).map(groups => groups.flat())
const anySettings = fc.record({
  blankRatio: fc.constantFrom(1, 5), presence: fc.constantFrom(0.5, 0.8, 1), reachLimit: fc.constantFrom(1, 3), foldLimit: fc.constantFrom(0.5, 1), alpha: fc.constantFrom(0.05, 0.5),
}).map(some => ({ ...comparisonDefaults, ...some }))
const neighbours: [number, number][] = [[0, 1], [4, 5], [5, 6]]

const swapSides = (input: SideInput): SideInput => ({ ...input, samples: input.samples.map(sample => ({ ...sample, side: sample.side === 'A' ? 'B' : sample.side === 'B' ? 'A' : null })) })
const reorder = (input: SideInput, order: number[]): SideInput => ({
  ...input,
  samples: order.flatMap(i => input.samples[i] ?? []),
  intensity: order.flatMap(i => input.intensity[i] ? [input.intensity[i]] : []),
  traceMaxima: order.map(i => input.traceMaxima?.[i] ?? null),
})

describe('verdicts', () => {
  it('are mirrored when the sides are swapped', () => {
    fc.assert(fc.property(anySamples, anySettings, (samples, settings) => {
      const input = comparisonInput(samples, { neighbours })
      const there = decideVerdicts(summariseSides(input), settings)
      const back = decideVerdicts(summariseSides(swapSides(input)), settings)
      const mirrored = [...there.columns.verdict].map((code) => { const name = VERDICTS[code]; return name ? MIRRORED[name] : name })
      expect([...back.columns.verdict].map(code => VERDICTS[code])).toEqual(mirrored)
      expect(back.columns.reason).toEqual(there.columns.reason)
      expect(back.columns.q).toEqual(there.columns.q)
      expect(back.columns.reach).toEqual(there.columns.reach)
      expect(back.columns.traceRatio).toEqual(there.columns.traceRatio)
      expect(back.columns.traceSamples).toEqual(there.columns.traceSamples)
      expect(back.columns.levelA).toEqual(there.columns.levelB)
      expect([...back.columns.log2Ratio].map(value => -value + 0)).toEqual([...there.columns.log2Ratio].map(value => value + 0))
      expect([...back.columns.low].map(value => -value + 0)).toEqual([...there.columns.high].map(value => value + 0))
    }), { numRuns: 200 })
  })

  it('do not depend on the order of the samples', () => {
    const shuffled = anySamples.chain(samples => fc.tuple(fc.constant(samples), fc.shuffledSubarray(samples.map((_, i) => i), { minLength: samples.length })))
    fc.assert(fc.property(shuffled, anySettings, ([samples, order], settings) => {
      const input = comparisonInput(samples, { neighbours })
      const straight = decideVerdicts(summariseSides(input), settings)
      const mixed = decideVerdicts(summariseSides(reorder(input, order)), settings)
      expect(mixed.columns).toEqual(straight.columns)
      expect(mixed.cautions.filter(caution => caution.includes('race'))).toEqual(straight.cautions.filter(caution => caution.includes('race')))
      expect(mixed.counts).toEqual(straight.counts)
      expect(mixed.chanceMore).toBe(straight.chanceMore)
    }), { numRuns: 200 })
  })

  it('do not change when all intensities and floors are scaled', () => {
    fc.assert(fc.property(anySamples, anySettings, (samples, settings) => {
      const scaled = samples.map(sample => ({ ...sample, values: sample.values.map(value => value * 1024), floor: (sample.floor ?? 0) * 1024, trace: sample.trace?.map(value => value * 1024) }))
      const plain = decideVerdicts(summariseSides(comparisonInput(samples)), settings)
      const large = decideVerdicts(summariseSides(comparisonInput(scaled)), settings)
      expect(large.columns.verdict).toEqual(plain.columns.verdict)
    }), { numRuns: 100 })
  })

  it('leave their input as it was', () => {
    const input = comparisonInput([{ name: 'a', side: 'A', values: [1000, none], trace: [500, 20] }, { name: 'b', side: 'B', values: [900, 200] }])
    const before = structuredClone(input)
    decideVerdicts(summariseSides(input), comparisonDefaults)
    expect(input).toEqual(before)
  })
})
