import type { ColumnSurvey } from './columnSurvey'
import type { DecimalMark, ThousandsMark } from './layout'

export interface NumberMarks { decimalMark: DecimalMark, thousandsMark: ThousandsMark }

const sum = (surveys: readonly ColumnSurvey[], key: Exclude<keyof ColumnSurvey, 'example' | 'first' | 'varied'>) => surveys.reduce((total, survey) => total + survey[key], 0)

/** The decimal mark that the numbers themselves prove; null where none of them can decide. Where both are proven the commoner one holds. */
function provenDecimal(surveys: readonly ColumnSurvey[]): DecimalMark | null {
  const points = sum(surveys, 'pointDecimals')
  const commas = sum(surveys, 'commaDecimals')
  if (points > 0 || commas > 0) return points >= commas ? '.' : ','
  const pointThousands = sum(surveys, 'pointThousands')
  const commaThousands = sum(surveys, 'commaThousands')
  if (pointThousands > 0 || commaThousands > 0) return commaThousands >= pointThousands ? '.' : ','
  return null
}

/** The thousands mark that stands beside a decimal mark, from what the numbers show. */
export function thousandsBeside(surveys: readonly ColumnSurvey[], decimalMark: DecimalMark): ThousandsMark {
  if (decimalMark === '.' && sum(surveys, 'commaThousands') + sum(surveys, 'commaEither') > 0) return ','
  if (decimalMark === ',' && sum(surveys, 'pointThousands') + sum(surveys, 'pointEither') > 0) return '.'
  const spaces = sum(surveys, 'spaceThousands')
  const apostrophes = sum(surveys, 'apostropheThousands')
  if (spaces === 0 && apostrophes === 0) return ''
  return spaces >= apostrophes ? ' ' : '\''
}

/**
 * Marks of m/z and time columns. A number of the form "13.412" or "13,412" alone is taken as having decimals:
 * thousands of m/z or of minutes do not occur beside three-digit groups only.
 */
export function positionMarks(surveys: readonly ColumnSurvey[]): NumberMarks {
  const decimalMark = provenDecimal(surveys) ?? (sum(surveys, 'commaEither') > sum(surveys, 'pointEither') ? ',' : '.')
  return { decimalMark, thousandsMark: thousandsBeside(surveys, decimalMark) }
}

/** Whether m/z and time columns show which mark they use at all. */
export function showsDecimal(surveys: readonly ColumnSurvey[]): boolean {
  return sum(surveys, 'pointDecimals') + sum(surveys, 'commaDecimals') + sum(surveys, 'pointEither') + sum(surveys, 'commaEither') > 0
}

/**
 * Marks of intensity columns, or null where "12,345" can be twelve thousand or twelve and a bit and no other number of the column tells.
 * A mark that the m/z and time columns use for decimals is one here too.
 */
export function intensityMarks(surveys: readonly ColumnSurvey[], positionDecimal: DecimalMark | null): NumberMarks | null {
  const proven = provenDecimal(surveys)
  const points = sum(surveys, 'pointEither')
  const commas = sum(surveys, 'commaEither')
  let decimalMark = proven
  if (decimalMark === null && points + commas === 0) decimalMark = positionDecimal ?? '.'
  else if (decimalMark === null && positionDecimal === '.' && commas === 0) decimalMark = '.'
  else if (decimalMark === null && positionDecimal === ',' && points === 0) decimalMark = ','
  return decimalMark === null ? null : { decimalMark, thousandsMark: thousandsBeside(surveys, decimalMark) }
}
