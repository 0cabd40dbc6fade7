import { isMissing } from './missingWords'

/** How the numbers of one column are written, counted over the whole file: the evidence for its decimal and thousands marks. */
export interface ColumnSurvey {
  /** Cells that are not empty. */
  filled: number
  /** Cells that say "not detected", empty ones included. */
  missing: number
  /** Cells that are a number in some way of writing. */
  numbers: number
  /** Cells that are neither a number nor a word for "not detected". */
  texts: number
  /** The first filled cell, and whether another differs from it. */
  first: string
  varied: boolean
  /** Numbers whose point, or comma, can only be a decimal mark ("12.5", "0,123"). */
  pointDecimals: number
  commaDecimals: number
  /** Numbers whose point, comma, space or apostrophe can only be a thousands mark ("1,234.5", "1.234.567"). */
  pointThousands: number
  commaThousands: number
  spaceThousands: number
  apostropheThousands: number
  /** Numbers that can be read both ways ("12.345", "12,345"). */
  pointEither: number
  commaEither: number
  /** The first cell that can be read both ways. */
  example: string
  /** The largest number (at least 0) where the point is the decimal mark, and where the comma is. */
  largestWithPoint: number
  largestWithComma: number
}

export function emptySurvey(): ColumnSurvey {
  return { filled: 0, missing: 0, numbers: 0, texts: 0, first: '', varied: false, pointDecimals: 0, commaDecimals: 0, pointThousands: 0, commaThousands: 0, spaceThousands: 0, apostropheThousands: 0,
    pointEither: 0, commaEither: 0, example: '', largestWithPoint: 0, largestWithComma: 0 }
}

const plainNumber = /^[+-]?\d+(\.\d*)?$/
const number = /^[+\-−]?(\d[\d.,'’ \u00A0\u202F\u2009]*|[.,]\d+)(e[+\-−]?\d+)?$/i
const oddSpaces = /[\u00A0\u202F\u2009]/g
const either = /^[1-9]\d{0,2}[.,]\d{3}$/

/** Adds one cell to the survey of its column. */
export function surveyCell(survey: ColumnSurvey, cell: string): void {
  const missing = isMissing(cell)
  if (missing) survey.missing++
  const text = cell.trim()
  if (text === '') return
  survey.filled++
  if (survey.first === '') survey.first = text.slice(0, 80)
  else if (!survey.varied && text.slice(0, 80) !== survey.first) survey.varied = true
  if (plainNumber.test(text)) return surveyPlain(survey, text)
  const match = number.exec(text)
  const before = survey.numbers
  if (match?.[1] !== undefined) surveyMarked(survey, text, match[1].trimEnd(), match[2] ?? '')
  if (survey.numbers === before && !missing) survey.texts++
}

/** Whether a column holds numbers: at most a third of its filled cells are other words. */
export function holdsNumbers(survey: ColumnSurvey): boolean {
  return survey.numbers > 0 && 3 * survey.texts <= survey.filled
}

/** Digits with at most one point: by far the commonest way, so it has a path of its own. */
function surveyPlain(survey: ColumnSurvey, text: string): void {
  survey.numbers++
  const value = Number(text)
  if (value > survey.largestWithPoint) survey.largestWithPoint = value
  const point = text.indexOf('.')
  if (point < 0) {
    if (value > survey.largestWithComma) survey.largestWithComma = value
  }
  else if (either.test(text.replace(/^[+-]/, ''))) {
    survey.pointEither++
    if (survey.example === '') survey.example = text
    largest(survey, 'largestWithComma', text.replace('.', ''))
  }
  else survey.pointDecimals++
}

function largest(survey: ColumnSurvey, key: 'largestWithPoint' | 'largestWithComma', text: string): void {
  const value = Number(text.replace('−', '-'))
  if (value > survey[key]) survey[key] = value
}

function surveyMarked(survey: ColumnSurvey, text: string, mantissa: string, exponent: string): void {
  const sign = /^[−-]/.test(text) ? '-' : ''
  const space = oddSpaces.test(mantissa) || mantissa.includes(' ')
  oddSpaces.lastIndex = 0
  const apostrophe = /['’]/.test(mantissa)
  if (space && apostrophe) return
  const whole = mantissa.replace(/[.,]\d*$/, '')
  if ((space || apostrophe) && !/^\d{1,3}([ '’\u00A0\u202F\u2009]\d{3})+$/.test(whole)) return
  const bare = mantissa.replace(/[ '’\u00A0\u202F\u2009]/g, '')
  const points = bare.split('.').length - 1
  const commas = bare.split(',').length - 1
  const inGroups = (mark: string, to: string) => new RegExp(`^\\d{1,3}(\\${mark}\\d{3})+$`).test(to)

  const count = (key: 'pointDecimals' | 'commaDecimals' | 'pointThousands' | 'commaThousands' | 'pointEither' | 'commaEither') => survey[key]++
  if (points > 0 && commas > 0) {
    const last = Math.max(bare.lastIndexOf('.'), bare.lastIndexOf(','))
    const decimal = bare[last]
    const thousands = decimal === '.' ? ',' : '.'
    if (!inGroups(thousands, bare.slice(0, last))) return
    count(decimal === '.' ? 'pointDecimals' : 'commaDecimals')
    count(decimal === '.' ? 'commaThousands' : 'pointThousands')
  }
  else if (points > 1 || commas > 1) {
    if (!inGroups(points > 1 ? '.' : ',', bare)) return
    count(points > 1 ? 'pointThousands' : 'commaThousands')
  }
  else if (points + commas === 1) {
    const canBeBoth = !space && !apostrophe && exponent === '' && either.test(bare)
    if (canBeBoth && survey.example === '') survey.example = text
    if (points === 1) count(canBeBoth ? 'pointEither' : 'pointDecimals')
    else count(canBeBoth ? 'commaEither' : 'commaDecimals')
  }
  survey.numbers++
  if (space) survey.spaceThousands++
  if (apostrophe) survey.apostropheThousands++
  if (commas <= 1) largest(survey, 'largestWithComma', sign + bare.replaceAll('.', '').replace(',', '.') + exponent)
  if (points <= 1) largest(survey, 'largestWithPoint', sign + bare.replaceAll(',', '') + exponent)
}
