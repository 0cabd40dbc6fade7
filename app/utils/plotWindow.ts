/** The part of a plot that is shown, in the numbers of its axes. */
export interface PlotWindow { x: [number, number], y: [number, number] }

const DECIMALS = 3
const NARROWEST = 0.01
const LARGEST = 1000

/** A window as the address holds it, rounded and not too small; undefined: no window. */
export function windowOf(x: readonly [number, number], y: readonly [number, number]): PlotWindow | undefined {
  const ends = (one: number, other: number): [number, number] => {
    const round = (value: number) => Number(value.toFixed(DECIMALS)) + 0
    return [round(Math.min(one, other)), round(Math.max(one, other))]
  }
  const shown = { x: ends(...x), y: ends(...y) }
  const isWindow = [shown.x, shown.y].every(([low, high]) => high - low >= NARROWEST && Math.abs(low) <= LARGEST && Math.abs(high) <= LARGEST)
  return isWindow ? shown : undefined
}

export const writeWindow = (shown: PlotWindow | null) => shown ? [...shown.x, ...shown.y].join(',') : ''

/** Reads a window from an address, whatever a person made of it. */
export function readWindow(text: string): PlotWindow | undefined {
  const [left = Number.NaN, right = Number.NaN, low = Number.NaN, high = Number.NaN, ...more] = text.split(',').map(part => part.trim() === '' ? Number.NaN : Number(part))
  return more.length === 0 ? windowOf([left, right], [low, high]) : undefined
}
