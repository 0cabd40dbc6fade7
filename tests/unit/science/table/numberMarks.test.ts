import { describe, expect, it } from 'vitest'
import { emptySurvey, holdsNumbers, surveyCell } from '../../../../shared/science/table/columnSurvey'
import { intensityMarks, positionMarks } from '../../../../shared/science/table/numberMarks'

function survey(...cells: string[]) {
  const column = emptySurvey()
  for (const cell of cells) surveyCell(column, cell)
  return column
}

describe('marks of an intensity column', () => {
  it.each<[string[], '.' | ',' | null, string | null]>([
    [['12345', '7'], null, '. and none'], [['12,345'], null, null], [['12,345'], '.', null], [['12,345'], ',', ', and none'], [['12.345'], '.', '. and none'], [['12.345'], ',', null], [['12.345'], null, null],
    [['12,345', '1,234,567'], '.', '. and ,'], [['12,345', '3.5'], '.', '. and ,'], [['12,345', '3,5'], '.', ', and none'], [['12,345', '0,123'], '.', ', and none'], [['12,345.6'], null, '. and ,'], [['12.345,6'], null, ', and .'],
    [['1 234', '12,345'], ',', ', and space'], [['1\u00A0234,5'], null, ', and space'], [['1\'234.5'], null, '. and \''], [['1’234', '5'], '.', '. and \''], [['1,2E+05'], '.', ', and none'], [['12345', '12,345', '12.345'], null, null],
  ])('%j where times use %j: %j', (cells, position, expected) => {
    const marks = intensityMarks([survey(...cells)], position)
    expect(marks && `${marks.decimalMark} and ${marks.thousandsMark === '' ? 'none' : marks.thousandsMark === ' ' ? 'space' : marks.thousandsMark}`).toBe(expected)
  })

  it('decides over all sample columns of a wide table', () => {
    expect(intensityMarks([survey('12,345'), survey('7.5')], '.')).toEqual({ decimalMark: '.', thousandsMark: ',' })
  })
})

describe('marks of m/z and time columns', () => {
  it('takes three decimals for decimals', () => {
    expect(positionMarks([survey('103.593'), survey('13.412')])).toEqual({ decimalMark: '.', thousandsMark: '' })
    expect(positionMarks([survey('103,593'), survey('13,412')])).toEqual({ decimalMark: ',', thousandsMark: '' })
  })
  it('sees thousands where they are proven', () => expect(positionMarks([survey('1,203.5', '103.5')])).toEqual({ decimalMark: '.', thousandsMark: ',' }))
})

describe('the survey of a column', () => {
  it('tells numbers, words for nothing, and text apart', () => {
    expect(survey('1', '', 'n.d.', '0', 'abc', '1,2e5')).toMatchObject({ filled: 5, missing: 3, numbers: 3, texts: 1, varied: true, first: '1' })
  })
  it('knows the largest number in both readings', () => expect(survey('12,5', '831', '1.234')).toMatchObject({ largestWithPoint: 831, largestWithComma: 1234 }))
  it('lets a few words stand in a column of numbers', () => {
    expect(holdsNumbers(survey('1', '2', '3', '4', '5', 'x'))).toBe(true)
    expect(holdsNumbers(survey('1', 'x'))).toBe(false)
    expect(holdsNumbers(survey('', 'NA'))).toBe(false)
  })
})
