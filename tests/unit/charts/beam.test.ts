import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { beamEnds, beamLean, MOST_DEGREES } from '../../../app/charts/beam'
import { sideText } from '../../../app/charts/sideText'
import type { Verdict } from '../../../shared/science/verdict/verdicts'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const counts = (part: Partial<Record<Verdict, number>>): Record<Verdict, number> => ({ inNeither: 0, onlyA: 0, onlyB: 0, moreA: 0, moreB: 0, level: 0, unsettled: 0, setAside: 0, ...part })
const number = fc.nat(100_000)

describe('the beam', () => {
  it('leans to the side with more, in proportion, and never beyond 6°', () => {
    fc.assert(fc.property(number, number, number, number, (onlyA, moreA, onlyB, moreB) => {
      const { degrees } = beamLean(counts({ onlyA, moreA, onlyB, moreB }), names)
      expect(Math.abs(degrees)).toBeLessThanOrEqual(MOST_DEGREES)
      expect(Math.sign(degrees)).toBe(Math.sign(onlyB + moreB - onlyA - moreA))
    }))
  })

  it('mirrors when the sides are swapped', () => {
    const lean = beamLean(counts({ onlyA: 41, moreA: 120, onlyB: 12, moreB: 98 }), names).degrees
    expect(beamLean(counts({ onlyB: 41, moreB: 120, onlyA: 12, moreA: 98 }), names).degrees).toBeCloseTo(-lean)
  })

  it('is level when balanced, whatever else there is', () => {
    expect(beamLean(counts({ onlyA: 3, moreB: 3, level: 900, unsettled: 40 }), names).degrees).toBe(0)
    expect(beamLean(counts({}), names).text).toMatch(/^Level/)
  })

  it('names the side it leans to', () => {
    expect(beamLean(counts({ onlyB: 5, moreA: 2 }), names).text).toBe('Leans to Tallow Lane: 5 features are found only there or are more there, 2 on the other side.')
  })

  it('keeps its length on the drawing, B down for a positive lean', () => {
    const { left, right } = beamEnds(6, [300, 34], 250)
    expect(Math.hypot(right[0] - left[0], right[1] - left[1])).toBeCloseTo(500)
    expect(right[1]).toBeGreaterThan(left[1])
  })
})

describe('a side in a line', () => {
  const sample = (name: string, rest: object = {}) => ({ name, kind: 'sample' as const, side: 'A' as const, preparation: name, amount: 100, amountUnit: 'mg' as const, ...rest })

  it('counts preparations and gives the range of weights', () => {
    expect(sideText([sample('M1'), sample('M2', { amount: 98.2 }), sample('T1', { side: 'B', amount: 3 })], 'A')).toBe('2 preparations, 98.2 to 100 mg')
    expect(sideText([sample('M1a', { preparation: 'M1' }), sample('M1b', { preparation: 'M1' })], 'A')).toBe('2 samples of 1 preparation, 100 mg')
  })

  it('says what is missing', () => {
    expect(sideText([sample('M1', { amount: null })], 'A')).toBe('1 preparation, no amount stated')
    expect(sideText([sample('M1'), sample('M2', { amount: null })], 'A')).toBe('2 preparations, 100 mg, 1 without amount')
  })
})
