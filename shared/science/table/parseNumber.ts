import type { DecimalMark, ThousandsMark } from './layout'

const isSpace = (code: number) => code === 0x20 || code === 0xA0 || code === 0x202F || code === 0x2009
const isApostrophe = (code: number) => code === 0x27 || code === 0x2019

function isThousands(code: number, mark: ThousandsMark): boolean {
  if (mark === '') return false
  if (mark === ' ') return isSpace(code)
  if (mark === '\'') return isApostrophe(code)
  return code === mark.charCodeAt(0)
}

/**
 * A number written with the given marks, also in scientific notation ("1,2E+05"). Groups between thousands marks must hold three digits.
 * Returns NaN for anything else ("Inf", "12 mg", "0x1F", ""), and Infinity where the number is too large for a double.
 */
export function parseNumber(text: string, decimalMark: DecimalMark, thousandsMark: ThousandsMark): number {
  const trimmed = text.trim()
  const length = trimmed.length
  const decimalCode = decimalMark.charCodeAt(0)
  let plain = decimalMark === '.'
  let digits = 0
  let group = 0
  let grouped = false
  let part: 'integer' | 'decimals' | 'exponent' = 'integer'
  for (let index = 0; index < length; index++) {
    const code = trimmed.charCodeAt(index)
    if (code >= 0x30 && code <= 0x39) {
      digits++
      group++
    }
    else if (code === decimalCode && part === 'integer') {
      if (grouped && group !== 3) return Number.NaN
      part = 'decimals'
    }
    else if ((code === 0x65 || code === 0x45) && part !== 'exponent' && digits > 0) {
      if (part === 'integer' && grouped && group !== 3) return Number.NaN
      part = 'exponent'
      digits = 0
    }
    else if (code === 0x2B || code === 0x2D || code === 0x2212) {
      const before = trimmed.charCodeAt(index - 1)
      if (index > 0 && before !== 0x65 && before !== 0x45) return Number.NaN
      if (code === 0x2212) plain = false
    }
    else if (part === 'integer' && isThousands(code, thousandsMark)) {
      if (grouped ? group !== 3 : group < 1 || group > 3) return Number.NaN
      grouped = true
      plain = false
      group = 0
    }
    else return Number.NaN
  }
  if (digits === 0 || (part === 'integer' && grouped && group !== 3)) return Number.NaN
  if (plain) return Number(trimmed)
  let clean = ''
  for (let index = 0; index < length; index++) {
    const code = trimmed.charCodeAt(index)
    if (code === decimalCode) clean += '.'
    else if (code === 0x2212) clean += '-'
    else if (!isThousands(code, thousandsMark)) clean += trimmed[index]
  }
  return Number(clean)
}
