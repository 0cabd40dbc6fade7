import { describe, expect, it } from 'vitest'
import { CannotCompare } from '../../../shared/science/normalisation/cannotCompare'
import { judge, none, onA, onB } from '../../support/comparisonInput'

describe('amounts', () => {
  it('compares per amount, volume, dilution and injection', () => {
    const { result, summary } = judge([
      onA('a1', [1000], { amount: 100, volumeMl: 2, dilution: 1, injectionUl: 2 }),
      onB('b1', [1000], { amount: 50, volumeMl: 2, dilution: 5, injectionUl: 1 }),
    ])
    expect(result.columns.log2Ratio[0]).toBeCloseTo(Math.log2(20), 12)
    expect([...summary.absoluteFactor]).toEqual([0.01, 0.2])
    expect(summary.amountUnit).toBe('mg')
  })

  it('does not compare a sample without amount with weighed ones, and says so', () => {
    const { result, cautions, summary } = judge([onA('a1', [1000]), onA('a2', [9000], { amount: null }), onB('b1', [1000])])
    expect(result.preparationsA).toBe(1)
    expect(result.columns.levelA[0]).toBe(1000)
    expect(summary.leftOut.map(({ index }) => index)).toEqual([1])
    expect(cautions).toContain('a2 has no amount and is not compared with samples that have.')
  })

  it('compares it where the amount step is off', () => {
    const { result, cautions } = judge([onA('a1', [1000]), onA('a2', [1000], { amount: null }), onB('b1', [1000])], { normaliseByAmount: false })
    expect(result.preparationsA).toBe(2)
    expect(cautions).toContain('The amount step is off: intensities are compared as injected, whatever was weighed and diluted.')
  })

  it('takes as equal, and says so, what no sample states', () => {
    const { result, cautions } = judge([onA('a1', [1000], { dilution: null, amount: null }), onB('b1', [1000], { dilution: null, amount: null })])
    expect(result.columns.log2Ratio[0]).toBe(0)
    expect(cautions).toContain('No compared sample states its amount, its dilution: taken as equal in all.')
  })

  it('never mixes mg and mL', () => {
    expect(() => judge([onA('a1', [1]), onB('b1', [1], { amountUnit: 'mL' })])).toThrow(CannotCompare)
    expect(() => judge([onA('a1', [1]), onB('b1', [1], { amountUnit: 'mL' })])).toThrow('Amounts in mg and in mL are mixed (in mL: b1)')
    expect(judge([onA('a1', [1], { amountUnit: 'mL' }), onB('b1', [1], { amountUnit: 'mL' })]).summary.amountUnit).toBe('mL')
  })

  it('warns where factors differ more than threefold', () => {
    const spread = (amount: number) => judge([onA('a1', [1], { amount: 100 }), onB('b1', [1], { amount })]).cautions.filter(caution => caution.startsWith('The amount factors'))
    expect(spread(34)).toEqual([])
    expect(spread(25)).toEqual(['The amount factors of the samples differ by ×4, more than ×3: the detector may not answer in proportion over that range.'])
  })
})

describe('sides', () => {
  it('asks for a sample on each', () => {
    expect(() => judge([onA('a1', [1])])).toThrow('Side B has no sample to compare. Give at least one sample of the sheet this side.')
    expect(() => judge([])).toThrow(CannotCompare)
    expect(() => judge([onA('a1', [1], { amount: null }), onB('b1', [1])])).toThrow(/^Side A has no sample to compare\. a1 has no amount/)
  })

  it('never holds a blank, a pooled QC or a standard', () => {
    const { result } = judge([onA('a1', [1000]), onA('pool', [9], { kind: 'pooledQc' }), onA('std', [9], { kind: 'standard' }), onB('b1', [1000])])
    expect(result.preparationsA).toBe(1)
    expect(result.columns.levelA[0]).toBe(1000)
  })
})

describe('cautions on the design', () => {
  const cautions = (a: object[], b: object[]) => judge([...a.map((rest, i) => onA(`a${i}`, [1], rest)), ...b.map((rest, i) => onB(`b${i}`, [1], rest))]).cautions.join('\n')

  it('points out sides that follow run order', () => {
    expect(cautions([{ runOrder: 1 }, { runOrder: 2 }], [{ runOrder: 3 }, { runOrder: 4 }])).toContain('ran before all of the other')
    expect(cautions([{ runOrder: 1 }, { runOrder: 3 }], [{ runOrder: 2 }, { runOrder: 4 }])).not.toContain('ran before')
    expect(cautions([{ runOrder: 1 }], [{ runOrder: 2 }])).not.toContain('ran before')
  })

  it('points out sides that follow batch', () => {
    expect(cautions([{ batch: '1' }], [{ batch: '2' }])).toContain('No batch holds samples of both sides')
    expect(cautions([{ batch: '1' }, { batch: '2' }], [{ batch: '2' }])).not.toContain('No batch')
    expect(cautions([{}], [{ batch: '2' }])).not.toContain('No batch')
  })

  it('points out mixed measures and estimated floors', () => {
    expect(cautions([{}], [{ measure: 'height' }])).toContain('Intensities are mixed: peak areas in a0; peak heights in b0.')
    expect(cautions([{}], [{ floorSource: 'estimated' }])).toContain('The floor of 1 of 2 tables is estimated')
  })
})

describe('awkward input', () => {
  it('takes a comparison without features', () => {
    const { result } = judge([onA('a1', []), onB('b1', [])])
    expect(result.columns.verdict).toHaveLength(0)
    expect(Object.values(result.counts).every(count => count === 0)).toBe(true)
  })

  it('takes a side that found nothing at all', () => {
    const { verdicts } = judge([onA('a1', [1000, none]), onB('b1', [none, none])])
    expect(verdicts).toEqual(['onlyA', 'inNeither'])
  })

  it('counts every feature once', () => {
    const { result } = judge([onA('a1', [1000, none, 500]), onB('b1', [none, none, 450])])
    expect(Object.values(result.counts).reduce((sum, count) => sum + count, 0)).toBe(3)
  })
})
