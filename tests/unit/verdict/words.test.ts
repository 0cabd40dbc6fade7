import { describe, expect, it } from 'vitest'
import { counted, foldTimes, namedProbability, probability, signed, threeDigits, times } from '../../../shared/science/numeric/numberWords'
import { REASON, REASON_LABELS, REASONS } from '../../../shared/science/verdict/reasons'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { settingWords } from '../../../shared/science/verdict/settingWords'
import { verdictPhrase } from '../../../shared/science/verdict/verdictPhrase'
import { VERDICT, VERDICTS } from '../../../shared/science/verdict/verdicts'

const names = { a: 'Millrace', b: 'Tallow Lane' }

describe('numbers in words', () => {
  it('have three digits and no exponent where a person reads them', () => {
    expect([12.3456, 0.031234, 12_449, 1, 0].map(threeDigits)).toEqual(['12.3', '0.0312', '12400', '1', '0'])
    expect(times(2.5)).toBe('×2.5')
    expect([-2, 2, 0].map(foldTimes)).toEqual(['×4', '×4', '×1'])
    expect([1.234, -0.5, 0.001, -0.001].map(value => signed(value, 2))).toEqual(['+1.23', '−0.50', '0.00', '0.00'])
    expect([0.0512, 0.001, 0.000_32, 3.24e-17, 0].map(probability)).toEqual(['0.051', '0.0010', '3.2e-4', '< 1e-15', '< 1e-15'])
    expect([0.05, 0].map(q => namedProbability('q', q))).toEqual(['q = 0.050', 'q < 1e-15'])
    expect([counted(1, 'feature'), counted(0, 'feature'), counted(38_681, 'feature'), counted(2, 'of it', 'of them')]).toEqual(['1 feature', '0 features', '38\u202F681 features', '2 of them'])
  })
})

describe('verdicts in words', () => {
  it('are those of the product', () => {
    expect(VERDICTS.map((_, code) => verdictPhrase(code, 1, names))).toEqual([
      'in neither side', 'found only in Millrace', 'found only in Tallow Lane', 'more in Millrace', 'more in Tallow Lane', 'level within ×2', 'unsettled', 'set aside',
    ])
    expect(verdictPhrase(VERDICT.level, 0.5, names)).toBe('level within ×1.41')
  })

  it('give a patchy but clear one its factor', () => {
    expect(verdictPhrase(VERDICT.moreB, 1, names, { reason: REASON.patchyClear, atLeast: 4.2 })).toBe('more in Tallow Lane, at least ×4.2')
    expect(verdictPhrase(VERDICT.moreB, 1, names, { reason: REASON.moreTested, atLeast: Number.NaN })).toBe('more in Tallow Lane')
  })

  it('have a label for every reason', () => {
    expect(Object.keys(REASON_LABELS)).toEqual([...REASONS])
  })

  it('keep the codes that stored versions rest on', () => {
    expect(VERDICTS.join(' ')).toBe('inNeither onlyA onlyB moreA moreB level unsettled setAside')
    expect(REASONS.slice(0, 22).join(' ')).toBe('inNeither divert intensityLimit blankBorne byHand foundOnly neighbour gapFilled belowReach patchyClear patchy moreTested moreAssumed levelTested levelSmallDifference levelAssumed notCertain smallNotLevel smallButCertain assumedBetween noSpread blankOverlap')
  })
})

describe('settings in words', () => {
  it('name every limit', () => {
    const words = Object.fromEntries(settingWords({ ...comparisonDefaults, divertWindows: [{ startMinutes: 0, endMinutes: 1.2 }], intensityLimit: 5000 }))
    expect(words).toMatchObject({
      'Amount step': 'on', 'Blank ratio': '×5', 'Sent to waste': '0 to 1.2 min', 'Intensity limit': '5000', 'Presence': '80 % of preparations',
      'Reach limit': '×3', 'Fold limit': '×2', 'Alpha': '0.05', 'Assumed precision without replicates': '20 %', 'Features set aside by hand': 'none',
    })
  })
})
