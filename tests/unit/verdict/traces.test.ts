import { describe, expect, it } from 'vitest'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import { blank, judge, none, onA, onB, type Written } from '../../support/comparisonInput'

/** Three injections a side of one feature: A shows it at 1000, B does not; `a` and `b` are what their traces hold (undefined: no trace). */
const pair = (a: readonly (number | undefined)[], b: readonly (number | undefined)[], rest: Partial<ComparedSample> = {}): Written[] => [
  ...a.map((value, i) => onA(`a${i + 1}`, [1000], { ...rest, ...(value === undefined ? {} : { trace: [value] }) })),
  ...b.map((value, i) => onB(`b${i + 1}`, [none], { ...rest, ...(value === undefined ? {} : { trace: [value] }) })),
]
const checked = ({ result }: ReturnType<typeof judge>) => ({ ratio: result.columns.traceRatio[0], samples: result.columns.traceSamples[0] })

describe('a signal in the trace of the side that does not list it', () => {
  it('unsettles what would be found only on one side, from a reach limit\'s share of the present side on', () => {
    const above = judge(pair([600, 600, 600], [201, 0, none]))
    expect(above.verdicts).toEqual(['unsettled'])
    expect(above.reasons).toEqual(['signalInTrace'])
    expect(above.sentences[0]).toBe('Found in 3 of 3 preparations of Millrace, in none of Tallow Lane; but a signal stands in Tallow Lane\'s trace (2 of 3 samples) that its table does not list: up to ×0.335 of Millrace\'s there, and less than ×0.333 is asked.')
    expect(judge(pair([600, 600, 600], [199, 0, none])).verdicts).toEqual(['onlyA'])
    expect(judge(pair([600, 600, 600], [199, 0, none]), { reachLimit: 4 }).reasons).toEqual(['signalInTrace'])
  })

  it('is looked for whichever side lacks the feature', () => {
    const { verdicts, reasons, sentences } = judge([onA('a1', [none], { trace: [400] }), onB('b1', [1000], { trace: [500] })])
    expect([verdicts, reasons]).toEqual([['unsettled'], ['signalInTrace']])
    expect(sentences[0]).toContain('a signal stands in Millrace\'s trace (1 of 1 sample) that its table does not list: up to ×0.8 of Tallow Lane\'s there')
  })

  it('is said where none is seen', () => {
    const { verdicts, reasons, sentences } = judge(pair([500, 500, 500], [10, 8, 5]))
    expect([verdicts, reasons]).toEqual([['onlyA'], ['foundOnly']])
    expect(sentences[0]).toMatch(/so it would have been seen there\. Trace seen: Tallow Lane's trace \(3 of 3 samples\) shows at most ×0\.02 of Millrace's there\.$/)
    expect(judge(pair([500, 500, 500], [0, 0, 0])).sentences[0]).toMatch(/Trace seen: Tallow Lane's trace \(3 of 3 samples\) shows nothing there\.$/)
    expect(judge(pair([500], [0])).sentences[0]).toMatch(/shows nothing there\. It rests on one injection\.$/)
  })

  it('is measured by the median over the preparations of the present side, injections averaged in log2', () => {
    const prepared = (name: string, preparation: string, trace: number) => onA(name, [1000], { preparation, trace: [trace] })
    const { result } = judge([prepared('a1', 'one', 100), prepared('a2', 'one', 400), prepared('a3', 'two', 300), prepared('a4', 'three', 9000), onB('b1', [none], { trace: [30] }), onB('b2', [none], { trace: [15] })])
    expect(result.columns.traceRatio[0]).toBeCloseTo(30 / 300, 12)
  })

  it('is normalised as its sample is', () => {
    const written = [onA('a1', [1000], { trace: [500], amount: 100 }), onB('b1', [none], { trace: [100], amount: 50 })]
    expect(checked(judge(written)).ratio).toBeCloseTo(0.4, 12)
    expect(judge(written).reasons).toEqual(['signalInTrace'])
    expect(checked(judge(written, { normaliseByAmount: false })).ratio).toBeCloseTo(0.2, 12)
    expect(judge(written, { normaliseByAmount: false }).verdicts).toEqual(['onlyA'])
  })

  it('leaves out samples of the present side whose trace shows nothing', () => {
    expect(checked(judge(pair([0, none, 500], [50, undefined, 50])))).toEqual({ ratio: 0.1, samples: 2 })
  })

  it('counts no sample that is not compared', () => {
    const judged = judge([...pair([500, 500, 500], [0, 0, 0]), { name: 'elsewhere', values: [none], trace: [5000] }, { name: 'pool', kind: 'pooledQc', values: [800], trace: [5000] }])
    expect(judged.verdicts).toEqual(['onlyA'])
    expect(checked(judged)).toEqual({ ratio: 0, samples: 3 })
  })
})

describe('where there is nothing to check', () => {
  it('says so, as before', () => {
    for (const written of [pair([undefined], [undefined]), pair([500], [undefined]), pair([500], [none])]) {
      const judged = judge(written)
      expect(judged.verdicts).toEqual(['onlyA'])
      expect(judged.sentences[0]).toMatch(/so it would have been seen there\. No trace to check\. It rests on one injection\.$/)
      expect(checked(judged)).toEqual({ ratio: none, samples: 0 })
    }
  })

  it('takes heights of the present side for its trace, but never areas', () => {
    const byHeight = judge(pair([undefined, undefined, undefined], [500, 0, 0], { measure: 'height' }))
    expect([byHeight.reasons, checked(byHeight)]).toEqual([['signalInTrace'], { ratio: 0.5, samples: 3 }])
    for (const measure of ['area', 'unknown'] as const) {
      const judged = judge(pair([undefined, undefined, undefined], [500, 0, 0], { measure }))
      expect(judged.verdicts).toEqual(['onlyA'])
      expect(checked(judged)).toEqual({ ratio: none, samples: 3 })
      expect(judged.sentences[0]).toContain('Tallow Lane\'s trace (3 of 3 samples) can\'t be checked: there is no trace of Millrace with a signal there to measure by, and its tables do not give heights.')
    }
  })

  it('takes heights too where the present side\'s trace shows nothing there', () => {
    expect(checked(judge(pair([0], [250], { measure: 'height' })))).toEqual({ ratio: 0.25, samples: 1 })
    expect(checked(judge(pair([0], [250])))).toEqual({ ratio: none, samples: 1 })
  })
})

describe('the order of the rules', () => {
  const rows = (rest: Partial<Written> = {}) => [onA('a1', [1000, none], { trace: [500, 0] }), onB('b1', [none, 900], { trace: [400, 500], ...rest })]

  it('a neighbour comes before the trace', () => {
    const judged = judge(rows(), {}, [[0, 1]])
    expect(judged.reasons[0]).toBe('neighbour')
    expect(checked(judged)).toEqual({ ratio: 0.8, samples: 1 })
    expect(judge(rows()).reasons[0]).toBe('signalInTrace')
  })

  it('the trace comes before a gap-filled table and before the reach', () => {
    expect(judge(rows({ floor: 5000 })).reasons[0]).toBe('signalInTrace')
    expect(judge(rows({ floor: 5000, trace: [0, 500] })).reasons[0]).toBe('belowReach')
    expect(judge(rows({ gapFilled: true, floorSource: 'estimated' })).reasons[0]).toBe('signalInTrace')
    expect(judge(rows({ gapFilled: true, floorSource: 'estimated', trace: [0, 500] })).reasons[0]).toBe('gapFilled')
  })

  it('a trace that shows nothing never makes up for a reach that is too small', () => {
    expect(judge(pair([500], [0], { floor: 900 })).verdicts).toEqual(['unsettled'])
  })

  it('what is set aside, patchy, or present on both sides is not looked for', () => {
    const { reasons, result } = judge([
      onA('a1', [1000, 1000, 1000, 1000], { trace: [500, 500, 500, 500] }), onA('a2', [1000, none, 1000, 1000], { trace: [500, 500, 500, 500] }),
      onB('b1', [none, none, 100, 1000], { trace: [500, 500, 500, 500] }), onB('b2', [none, none, none, 1000], { trace: [500, 500, 500, 500] }),
    ], { setAsideByHand: [{ index: 0, reason: 'bleed' }] })
    expect(reasons).toEqual(['byHand', 'patchy', 'patchyClear', 'noSpread'])
    expect([...result.columns.traceRatio]).toEqual([none, none, none, none])
    expect([...result.columns.traceSamples]).toEqual([0, 0, 0, 0])
  })

  it('a side that is not above blank is not unsettled for the signal the blank check has judged', () => {
    const judged = judge([onA('a1', [2000], { trace: [1000] }), onB('b1', [300], { trace: [900] }), blank('blank 1', [200])])
    expect(judged.verdicts).toEqual(['onlyA'])
    expect(checked(judged)).toEqual({ ratio: none, samples: 0 })
    expect(judged.sentences[0]).toContain('No trace was asked: the signal there is listed, and was judged against the blank.')
  })
})

describe('cautions', () => {
  const about = (written: Written[]) => judge(written).cautions.filter(caution => caution.includes('race'))

  it('name the samples without a trace where others have one', () => {
    expect(about(pair([500, undefined], [0, undefined]))).toEqual(['Traces of 2 of 4 compared samples were looked into. What the tables of a2, b2 do not list was not looked for there.'])
    expect(about(pair([500], [0]))).toEqual([])
    expect(about(pair([undefined], [undefined]))).toEqual([])
  })

  it('say what a side without traces is measured by', () => {
    expect(about(pair([500], [undefined], { measure: 'height' }))[1]).toBe('Side B has no trace: what the traces of side A show is measured against the heights of its tables.')
    expect(about(pair([undefined], [0]))[1]).toBe('Side A has no trace, and its tables do not give heights: what the traces of side B show can\'t be measured, and moves no verdict.')
  })
})
