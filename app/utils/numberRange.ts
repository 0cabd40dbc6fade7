/** From and to, both included; null: open on that side. */
export interface NumberRange { from: number | null, to: number | null }

export const OPEN_RANGE: Readonly<NumberRange> = { from: null, to: null }

/** "1.5~3", "~0.05", "3~"; nothing for a range that is open on both sides. */
export function writeRange({ from, to }: NumberRange): string {
  return from === null && to === null ? '' : `${from ?? ''}~${to ?? ''}`
}

/** Reads what writeRange wrote; undefined where it is none. */
export function readRange(text: string): NumberRange | undefined {
  const parts = text.split('~').map(part => part === '' ? null : Number(part))
  const [from, to] = parts
  if (parts.length !== 2 || from === undefined || to === undefined || (from === null && to === null)) return undefined
  return [from, to].every(end => end === null || Number.isFinite(end)) ? { from, to } : undefined
}

/** Does a value lie in the range? What is no number does not. */
export function rangeRule(values: ArrayLike<number>, { from, to }: NumberRange): (feature: number) => boolean {
  const [low, high] = [from ?? Number.NEGATIVE_INFINITY, to ?? Number.POSITIVE_INFINITY]
  return (i) => {
    const value = values[i] ?? Number.NaN
    return value >= low && value <= high
  }
}

/** "from 1.5 to 3", "at least 3", "at most 0.05". `write` gives a bound its words. */
export function rangeWords({ from, to }: NumberRange, write: (bound: number) => string = String): string {
  if (from === null) return to === null ? 'any' : `at most ${write(to)}`
  return to === null ? `at least ${write(from)}` : `from ${write(from)} to ${write(to)}`
}
