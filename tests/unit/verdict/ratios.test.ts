import { describe, expect, it } from 'vitest'
import { judge, none, onA, onB, type Written } from '../../support/comparisonInput'

/** Three preparations a side, each feature given as its two triplets. */
const triplets = (...features: [readonly number[], readonly number[]][]): Written[] => [0, 1, 2].flatMap(p => [
  onA(`a${p + 1}`, features.map(([a]) => a[p] ?? none)),
  onB(`b${p + 1}`, features.map(([, b]) => b[p] ?? none)),
])

describe('patchy', () => {
  it('is unsettled where only some preparations of a side show it', () => {
    const { verdicts, reasons, sentences } = judge(triplets(
      [[1000, 1100, 1050], [400, none, none]],
      [[1000, none, none], [none, none, none]],
      [[1000, none, none], [none, 900, none]],
    ))
    expect(verdicts).toEqual(['unsettled', 'unsettled', 'unsettled'])
    expect(reasons).toEqual(['patchy', 'patchy', 'patchy'])
    expect(sentences[0]).toBe('Patchy: Found in 3 of 3 preparations of Millrace and in 1 of 3 preparations of Tallow Lane; the lowest of the one is only ×2.5 the highest of the other, floors included, and at least ×3 is asked. Present means at least 80 % of a side\'s preparations.')
  })

  it('but clear is more, at least by the factor', () => {
    const { verdicts, reasons, sentences, result } = judge(triplets([[1000, 1100, 1050], [300, none, none]], [[none, 90, none], [1000, 800, 900]]))
    expect(verdicts).toEqual(['moreA', 'moreB'])
    expect(reasons).toEqual(['patchyClear', 'patchyClear'])
    expect(result.columns.atLeast[0]).toBeCloseTo(1000 / 300, 12)
    expect(result.columns.atLeast[1]).toBeCloseTo(8, 12)
    expect(sentences[0]).toContain('The lowest value of Millrace is still ×3.33 everything of Tallow Lane')
    expect(result.columns.p[0]).toBeNaN()
  })

  it('asks for 2^foldLimit where that is more than the reach', () => {
    expect(judge(triplets([[1000, 1000, 1000], [300, none, none]]), { foldLimit: 2 }).reasons).toEqual(['patchy'])
  })

  it('does not trust empty cells of a gap-filled table', () => {
    const written = triplets([[1000, 1000, 1000], [50, none, none]]).map(sample => ({ ...sample, gapFilled: true, floorSource: 'estimated' as const }))
    const { reasons, sentences } = judge(written)
    expect(reasons).toEqual(['gapFilled'])
    expect(sentences[0]).toContain('Millrace holds at least ×10')
  })

  it('counts four of five preparations as present', () => {
    const five = (side: typeof onA, name: string, values: number[]) => values.map((value, i) => side(`${name}${i}`, [value]))
    const { reasons } = judge([...five(onA, 'a', [900, 1000, 1100, 1000, none]), ...five(onB, 'b', [1000, 1000, 1000, 1010, 990])])
    expect(reasons).toEqual(['levelTested'])
  })
})

describe('with replicates', () => {
  it('calls more where the fold is reached and q is small', () => {
    const { verdicts, reasons, result, sentences } = judge(triplets([[1000, 1050, 950], [4000, 4200, 3900]], [[4000, 4200, 3900], [1000, 1050, 950]]))
    expect(verdicts).toEqual(['moreB', 'moreA'])
    expect(reasons).toEqual(['moreTested', 'moreTested'])
    expect(result.columns.log2Ratio[0]).toBeGreaterThan(1.9)
    expect(result.columns.log2Ratio[1]).toBe(-(result.columns.log2Ratio[0] ?? 0))
    expect(result.testedFeatures).toBe(2)
    expect(sentences[0]).toMatch(/^Tallow Lane holds ×4\.0\d? of Millrace \(log2 B\/A \+2\.01\); 95 % interval of log2 B\/A \+1\.\d\d to \+2\.\d\d\. q = .*, at most 0\.05 is asked\.$/)
  })

  it('calls level what is equivalent, and says when a smaller difference is certain', () => {
    const { verdicts, reasons, sentences } = judge(triplets([[1000, 1100, 950], [1020, 980, 1080]], [[1000, 1005, 1010], [1300, 1305, 1290]]))
    expect(verdicts).toEqual(['level', 'level'])
    expect(reasons).toEqual(['levelTested', 'levelSmallDifference'])
    expect(sentences[1]).toContain('a smaller difference is certain')
  })

  it('leaves unsettled what is neither', () => {
    const { verdicts, reasons } = judge(triplets(
      [[200, 1000, 4000], [900, 4000, 15_000]],
      [[500, 1000, 2000], [600, 1100, 2300]],
    ))
    expect(verdicts).toEqual(['unsettled', 'unsettled'])
    expect(reasons).toEqual(['notCertain', 'smallNotLevel'])
    const certain = judge(triplets([[1000, 1040, 960], [1850, 1950, 1800]]))
    expect(certain.reasons).toEqual(['smallButCertain'])
    expect(certain.sentences[0]).toContain('but whether it reaches ×2 is open')
  })

  it('asks whether it is the same data twice where there is no spread', () => {
    const { verdicts, reasons, sentences, result } = judge(triplets([[1000, 1000, 1000], [4000, 4000, 4000]], [[1000, 1100, 900], [1000, 1100, 950]]))
    expect(verdicts).toEqual(['unsettled', 'level'])
    expect(reasons[0]).toBe('noSpread')
    expect(sentences[0]).toContain('the same data twice?')
    expect(result.testedFeatures).toBe(1)
  })

  it('corrects over tested features only', () => {
    const alone = judge(triplets([[1000, 1050, 950], [2500, 2400, 2900]]))
    const beside = judge(triplets([[1000, 1050, 950], [2500, 2400, 2900]], [[1000, 1050, 950], [none, none, none]]))
    expect(beside.result.columns.q[0]).toBe(alone.result.columns.q[0])
    expect(beside.result.columns.q[1]).toBeNaN()
  })
})

describe('without replicates', () => {
  it('judges 1 against 1 by an assumed precision, without a p-value', () => {
    const { verdicts, reasons, sentences, result, cautions } = judge([onA('a1', [1000, 1000, 1000, 4000]), onB('b1', [2100, 1500, 1200, 1000])])
    expect(verdicts).toEqual(['moreB', 'unsettled', 'level', 'moreA'])
    expect(reasons).toEqual(['moreAssumed', 'assumedBetween', 'levelAssumed', 'moreAssumed'])
    expect([...result.columns.p].every(Number.isNaN)).toBe(true)
    expect([...result.columns.q].every(Number.isNaN)).toBe(true)
    expect(result.testedFeatures).toBe(0)
    expect(result.assumedFeatures).toBe(4)
    expect(result.chanceMore).toBeCloseTo(4 * 0.013328398, 6)
    expect(sentences[1]).toContain('at an assumed precision of 20 %, 1 against 1 preparation, at least ×2 is called more and below ×1.26 level')
    expect(cautions[0]).toContain('Assumed precision: with 1 preparation of side A against 1 of side B there is no p-value')
  })

  it('judges 1 against 3 the same way, with the narrower error', () => {
    const { reasons, result } = judge([onA('a1', [1000, 1000]), onB('b1', [1280, 2100]), onB('b2', [1300, 2000]), onB('b3', [1320, 2300])])
    expect(reasons).toEqual(['levelAssumed', 'moreAssumed'])
    expect([...result.columns.p].every(Number.isNaN)).toBe(true)
    expect((result.columns.high[0] ?? 0) - (result.columns.log2Ratio[0] ?? 0)).toBeCloseTo(1.959963985 * 0.285714500 * Math.sqrt(4 / 3), 6)
  })

  it('averages three injections of one preparation in log2 and counts them once', () => {
    const injections = [500, 1000, 2000].map((value, i) => onA(`a1 injection ${i + 1}`, [value], { preparation: 'bottle 1' }))
    const { result, reasons, sentences } = judge([...injections, onB('b1', [1100])])
    expect(result.preparationsA).toBe(1)
    expect(result.columns.detectedA[0]).toBe(1)
    expect(result.columns.injectionsA[0]).toBe(3)
    expect(result.columns.levelA[0]).toBeCloseTo(1000, 9)
    expect(reasons).toEqual(['levelAssumed'])
    expect(sentences[0]).toContain('1 against 1 preparation')
  })

  it('says when nothing can be level at this precision', () => {
    const { result, cautions } = judge([onA('a1', [1000]), onB('b1', [1000])], { assumedCvPercent: 40 })
    expect(result.nothingCanBeLevel).toBe(true)
    expect(cautions).toContain('At an assumed precision of 40 % nothing can be called level within ×2.')
    expect(result.counts.level).toBe(0)
  })
})
