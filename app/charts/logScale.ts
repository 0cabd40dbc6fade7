import { powerOfTen } from '~/utils/formatMeasures'

export interface LogScale {
  /** Where a value above 0 lies; held within the ends. */
  at: (value: number) => number
  /** Does a value lie between the ends? */
  holds: (value: number) => boolean
  ticks: { at: number, label: string }[]
}

const MARGIN = 0.15
const LEAST_DECADES = 0.6

/** A log axis from pixel `from` to pixel `to` that holds all of `values` that are above 0; what is not is left out of it. */
export function logScale(values: Iterable<number>, from: number, to: number): LogScale {
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (const value of values) {
    if (!(value > 0) || !Number.isFinite(value)) continue
    low = Math.min(low, Math.log10(value))
    high = Math.max(high, Math.log10(value))
  }
  if (low > high) [low, high] = [0 + MARGIN, 1 - MARGIN]
  low -= MARGIN
  high = Math.max(low + LEAST_DECADES, high + MARGIN)
  const place = (exponent: number) => from + (Math.min(high, Math.max(low, exponent)) - low) / (high - low) * (to - from)
  return {
    at: value => place(Math.log10(value)),
    holds: value => Math.log10(value) >= low && Math.log10(value) <= high,
    ticks: ticksBetween(low, high).map(({ exponent, label }) => ({ at: place(exponent), label })),
  }
}

/** Powers of ten, not all of them over many decades; 2 and 5 times them where there are few. */
function ticksBetween(low: number, high: number) {
  const steps = high - low < 1.6 ? [1, 2, 5] : [1]
  const every = Math.max(1, Math.ceil((high - low) / 8))
  const ticks = []
  for (let exponent = Math.floor(low); exponent <= high; exponent++) {
    if (exponent % every !== 0) continue
    for (const step of steps) {
      const at = exponent + Math.log10(step)
      if (at >= low && at <= high) ticks.push({ exponent: at, label: step === 1 ? powerOfTen(exponent) : `${step} × ${powerOfTen(exponent)}` })
    }
  }
  return ticks
}
