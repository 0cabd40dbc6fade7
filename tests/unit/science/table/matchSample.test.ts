import { describe, expect, it } from 'vitest'
import { matchSample } from '../../../../shared/science/table/matchSample'

const samples = ['Press A1', 'Press A11', 'Carton B1', 'QC', 'QC 2', 'Säft', 'A', 'a']

describe('the sample of a file', () => {
  it.each([
    ['Press A1.csv', 0], ['press_a1.TXT', 0], ['PRESS-A1.raw.csv', 0], ['PressA1.csv', 0], ['C:\\data\\Press A11.csv', 1], ['press a11', 1], ['Press A 1.mzML', 0],
    ['2026-03-02 Press A1 features.csv', 0], ['QC_2_neg.csv', 4], ['QC.csv', 3], ['QC 3.csv', 3], ['SAFT.csv', 5], ['säft.csv', 5],
    ['Press A12.csv', null], ['nothing.csv', null], ['', null], ['A.csv', null], ['QC and Säft.csv', null], ['.csv', null],
  ])('%j is sample %j', (name, expected) => expect(matchSample(name, samples)).toBe(expected))
  it('is none where there are none', () => expect(matchSample('x.csv', [])).toBeNull())
  it('is none for a sample without words', () => expect(matchSample('--.csv', ['--'])).toBeNull())
})
