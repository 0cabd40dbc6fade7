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

/** Below this a probability rests on the tail of a curve that nobody has measured. */
const SMALLEST_PROBABILITY = 1e-15

/** A probability with two significant digits: 0.050, 3.2e-7; "< 1e-15" and never 0. */
export function probability(p: number): string {
  if (p < SMALLEST_PROBABILITY) return '< 1e-15'
  return p >= 0.001 ? p.toPrecision(2) : p.toExponential(1)
}

/** A named probability within a sentence: "q = 0.050", "q < 1e-15". */
export function namedProbability(name: string, p: number): string {
  const text = probability(p)
  return text.startsWith('<') ? `${name} ${text}` : `${name} = ${text}`
}

/** A number with its sign, a real minus: "+1.23", "−0.50"; what rounds to zero has none. */
export function signed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals)
  return Number(text) === 0 ? text : `${value < 0 ? '−' : '+'}${text}`
}

/** A whole number with narrow spaces between thousands: 12 345. */
export function wholeNumber(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u202F')
}

/** "1 preparation", "3 preparations". */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${wholeNumber(count)} ${count === 1 ? one : many}`
}
