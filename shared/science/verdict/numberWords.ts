/** Three significant digits without an exponent: 12.4, 0.0312, 12 400 as 12400. */
export function threeDigits(value: number): string {
  const rounded = Number(value.toPrecision(3))
  return Math.abs(rounded) >= 1e-6 || rounded === 0 ? String(rounded) : value.toPrecision(3)
}

/** A ratio of 1 or more, as "×2.5". */
export function times(ratio: number): string {
  return `×${threeDigits(ratio)}`
}

/** The size of a log2 ratio as a ratio of 1 or more: 2^|log2 ratio|. */
export function foldTimes(log2Ratio: number): string {
  return times(2 ** Math.abs(log2Ratio))
}

const SUPERSCRIPT: Readonly<Record<string, string>> = { '-': '⁻', '0': '⁰', '1': '¹', '2': '²', '3': '³', '4': '⁴', '5': '⁵', '6': '⁶', '7': '⁷', '8': '⁸', '9': '⁹' }

/** A probability with two digits; below 0.001 as 3.2 × 10⁻⁷. */
export function probability(p: number): string {
  if (p >= 0.001) return String(Number(p.toPrecision(2)))
  const [digits, exponent] = p.toExponential(1).split('e')
  return `${digits} × 10${[...(exponent ?? '')].map(sign => SUPERSCRIPT[sign] ?? '').join('')}`
}

/** log2 with two decimals and its sign, a real minus. */
export function signedLog2(value: number): string {
  const text = Math.abs(value).toFixed(2)
  return Number(text) === 0 ? '0.00' : `${value < 0 ? '−' : '+'}${text}`
}

/** "1 preparation", "3 preparations". */
export function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`
}
