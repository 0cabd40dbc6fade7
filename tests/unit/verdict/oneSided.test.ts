import { describe, expect, it } from 'vitest'
import { blank, judge, none, onA, onB } from '../../support/comparisonInput'

const three = (side: typeof onA, rows: readonly (readonly number[])[]) => rows.map((values, i) => side(`${side === onA ? 'a' : 'b'}${i + 1}`, values))

describe('found only on one side', () => {
  it('asks for a reach of 3: 3.1 is enough, 2.9 is not', () => {
    const { verdicts, reasons, sentences, result } = judge([
      ...three(onA, [[310, 290], [310, 290], [310, 290]]),
      ...three(onB, [[none, none], [none, none], [none, none]]),
    ])
    expect(verdicts).toEqual(['onlyA', 'unsettled'])
    expect(reasons).toEqual(['foundOnly', 'belowReach'])
    expect(result.columns.reach[0]).toBeCloseTo(3.1, 12)
    expect(result.columns.reach[1]).toBeCloseTo(2.9, 12)
    expect(sentences[0]).toBe('Found in 3 of 3 preparations of Millrace, in none of Tallow Lane. It stands ×3.1 above the highest floor of Tallow Lane (at least ×3 is asked), so it would have been seen there. No trace to check.')
    expect(sentences[1]).toContain('Tallow Lane could not have shown it: it stands only ×2.9 above the highest floor')
  })

  it('never prints an infinite ratio', () => {
    const { result } = judge([...three(onA, [[1e6], [1e6], [1e6]]), ...three(onB, [[none], [none], [none]])])
    expect(result.columns.log2Ratio[0]).toBeNaN()
    expect(result.columns.low[0]).toBeNaN()
    expect(result.columns.p[0]).toBeNaN()
  })

  it('takes the highest floor of the other side and the median of the present one', () => {
    const { result } = judge([
      onA('a1', [300]), onA('a2', [900]), onA('a3', [600]),
      onB('b1', [none], { floor: 50 }), onB('b2', [none], { floor: 150 }),
    ])
    expect(result.columns.reach[0]).toBeCloseTo(4, 12)
  })

  it('normalises floors as their samples are', () => {
    const { result, verdicts } = judge([
      onA('a1', [900], { amount: 100 }),
      onB('b1', [none], { amount: 50, floor: 200 }),
    ])
    expect(result.columns.reach[0]).toBeCloseTo(900 / 100 / (200 / 50), 12)
    expect(verdicts).toEqual(['unsettled'])
  })

  it('holds a floor to at least the intensity limit', () => {
    expect(judge([onA('a1', [500]), onB('b1', [none])], { intensityLimit: 200 }).result.columns.reach[0]).toBeCloseTo(2.5, 12)
    expect(judge([onA('a1', [500]), onB('b1', [none], { floor: none })], { intensityLimit: 100 }).result.columns.reach[0]).toBeCloseTo(5, 12)
  })

  it('says so where a floor is not known', () => {
    const { reasons, sentences } = judge([onA('a1', [500]), onB('b1', [none], { floor: none })])
    expect(reasons).toEqual(['belowReach'])
    expect(sentences[0]).toContain('the floor of Tallow Lane is not known')
  })

  it('says when it rests on one injection', () => {
    const { sentences } = judge([onA('a1', [1000]), onB('b1', [none])])
    expect(sentences[0]).toMatch(/^Found in 1 of 1 preparation of Millrace, .* It rests on one injection\.$/)
  })

  it('is unsettled where a neighbour holds the other side', () => {
    const { verdicts, reasons, sentences, result } = judge([
      ...three(onA, [[1000, none], [1000, none], [1000, none]]),
      ...three(onB, [[none, 900], [none, 900], [none, none]]),
    ], {}, [[0, 1]])
    expect(verdicts).toEqual(['unsettled', 'unsettled'])
    expect(reasons).toEqual(['neighbour', 'patchy'])
    expect(result.columns.neighbour[0]).toBe(1)
    expect(sentences[0]).toContain('(m/z 201.0000, 2.00 min), within the tolerances, holds Tallow Lane')
  })

  it('does not mind a neighbour that holds the same side', () => {
    const { verdicts } = judge([onA('a1', [1000, 500]), onB('b1', [none, none])], {}, [[0, 1]])
    expect(verdicts).toEqual(['onlyA', 'onlyA'])
  })

  it('is off for a gap-filled wide table unless a floor is stated', () => {
    const filled = (floorSource: 'stated' | 'estimated') => judge([
      onA('a1', [1000], { gapFilled: true, floorSource }), onB('b1', [none], { gapFilled: true, floorSource }),
    ])
    expect(filled('estimated').reasons).toEqual(['gapFilled'])
    expect(filled('estimated').verdicts).toEqual(['unsettled'])
    expect(filled('estimated').sentences[0]).toContain('seems gap-filled')
    expect(filled('estimated').cautions.some(caution => caution.startsWith('a1, b1: under 1 % empty cells'))).toBe(true)
    expect(filled('stated').verdicts).toEqual(['onlyA'])
    expect(filled('stated').cautions.some(caution => caution.includes('gap-filled'))).toBe(false)
  })
})

describe('blanks', () => {
  it('sets aside what no side holds at 5 times the blank', () => {
    const { verdicts, reasons, sentences } = judge([
      onA('a1', [400, 500, 400]), onB('b1', [300, 300, none]), blank('blank 1', [100, 100, 100]),
    ])
    expect(verdicts).toEqual(['setAside', 'unsettled', 'setAside'])
    expect(reasons).toEqual(['blankBorne', 'blankOverlap', 'blankBorne'])
    expect(sentences[1]).toMatch(/but Millrace holds only ×1\.67 of what Tallow Lane shows, and at least ×3 is asked\.$/)
    expect(sentences[0]).toBe('Blank-borne: Millrace is ×4 the blank, Tallow Lane is ×3 the blank; at least ×5 is asked of one side.')
    expect(sentences[2]).toContain('Tallow Lane does not show it')
  })

  it('counts a side that is not above blank as not found, the blank standing for its floor', () => {
    const { verdicts, reasons, sentences, result } = judge([
      onA('a1', [2000, 290]), onB('b1', [300, 60]), blank('blank 1', [200, 50]),
    ])
    expect(result.columns.notAboveBlank[0]).toBe(2)
    expect(result.columns.reach[0]).toBeCloseTo(10, 12)
    expect(verdicts[0]).toBe('onlyA')
    expect(sentences[0]).toContain('in Tallow Lane not above the blank (Tallow Lane is ×1.5 the blank, ×5 is asked), which counts as not found')
    expect(sentences[0]).toContain('×10 above the blank\'s level in Tallow Lane')
    expect(result.columns.log2Ratio[0]).toBeNaN()
    expect(reasons[1]).toBe('belowReach')
    expect(result.columns.reach[1]).toBeCloseTo(2.9, 12)
  })

  it('compares per µL injected', () => {
    const { reasons } = judge([
      onA('a1', [1000], { injectionUl: 5 }), onB('b1', [1000], { injectionUl: 5 }), blank('blank 1', [150], { injectionUl: 1 }),
    ])
    expect(reasons).toEqual(['blankBorne'])
  })

  it('takes volumes as equal, and says so, where one is not known', () => {
    const { reasons, cautions } = judge([
      onA('a1', [1000], { injectionUl: 5 }), onB('b1', [1000], { injectionUl: 5 }), blank('blank 1', [150], { injectionUl: null }),
    ])
    expect(reasons).toEqual(['levelAssumed'])
    expect(cautions.some(caution => caution.startsWith('Injection volumes are not known'))).toBe(true)
  })

  it('prefers process blanks over solvent blanks', () => {
    const written = [onA('a1', [1000]), onB('b1', [1000]), blank('solvent', [10])]
    expect(judge(written).reasons).toEqual(['levelAssumed'])
    expect(judge([...written, blank('process', [500], { kind: 'processBlank' })]).reasons).toEqual(['blankBorne'])
  })

  it('averages over the blanks that detect it', () => {
    const { result } = judge([onA('a1', [1000]), onB('b1', [1000]), blank('one', [100]), blank('two', [300]), blank('three', [none])])
    expect(result.columns.blankRatioA[0]).toBeCloseTo(5, 12)
  })

  it('says when there are none', () => {
    expect(judge([onA('a1', [1]), onB('b1', [1])]).cautions).toContain('No blanks: features that come from solvents, vials or work-up are not recognised.')
  })
})

describe('set aside', () => {
  it('by divert window, intensity limit and hand, the first that holds', () => {
    const { verdicts, reasons, sentences } = judge([
      onA('a1', [1000, 40, 1000, 1000]), onB('b1', [1000, 50, 1000, 1000]),
    ], { divertWindows: [{ startMinutes: 0, endMinutes: 1 }], intensityLimit: 60, setAsideByHand: [{ index: 0, reason: 'known artefact' }, { index: 2, reason: 'column bleed' }] })
    expect(verdicts).toEqual(['setAside', 'setAside', 'setAside', 'level'])
    expect(reasons).toEqual(['divert', 'intensityLimit', 'byHand', 'levelAssumed'])
    expect(sentences[0]).toBe('Its time, 1.00 min, lies in a window that was sent to waste (0 to 1 min).')
    expect(sentences[1]).toBe('Its highest intensity in any table, 50, does not reach the intensity limit of 60.')
    expect(sentences[2]).toBe('Set aside by hand: column bleed.')
  })
})

describe('in neither side', () => {
  it('is not compared, not set aside and counted apart', () => {
    const { verdicts, sentences, result } = judge([
      onA('a1', [none, 1000]), onB('b1', [none, 1000]), { name: 'pool', kind: 'pooledQc', values: [1000, 1000] },
    ], { divertWindows: [{ startMinutes: 0, endMinutes: 1.5 }] })
    expect(verdicts).toEqual(['inNeither', 'level'])
    expect(sentences[0]).toBe('Found in no compared sample of Millrace or Tallow Lane; not compared.')
    expect(result.counts.inNeither).toBe(1)
  })
})
