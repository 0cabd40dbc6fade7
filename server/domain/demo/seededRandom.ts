/** A stream of random numbers that is the same for the same seed, on every machine. */
export interface SeededRandom {
  /** Uniform from `low` up to, not including, `high`. */
  between: (low: number, high: number) => number
  /** A whole number from `low` to `high`, both included. */
  whole: (low: number, high: number) => number
  normal: (mean: number, deviation: number) => number
  /** A factor around 1 with this coefficient of variation, %. */
  factor: (cvPercent: number) => number
  chance: (probability: number) => boolean
  pick: <T>(list: readonly T[]) => T
}

/**
 * Random numbers from a seed in words: a 32-bit FNV-1a hash of it starts a Weyl sequence whose values are mixed (the
 * finaliser of Appleby's MurmurHash3). Streams of different seeds do not depend on one another.
 */
export function seededRandom(seed: string): SeededRandom {
  let state = hashOf(seed)
  const next = () => {
    state = (state + 0x9E3779B9) | 0
    let mixed = state ^ (state >>> 16)
    mixed = Math.imul(mixed, 0x85EBCA6B)
    mixed ^= mixed >>> 13
    mixed = Math.imul(mixed, 0xC2B2AE35)
    return ((mixed ^ (mixed >>> 16)) >>> 0) / 2 ** 32
  }
  const between = (low: number, high: number) => low + (high - low) * next()
  const normal = (mean: number, deviation: number) => mean + deviation * Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next())
  return {
    between,
    normal,
    whole: (low, high) => Math.floor(between(low, high + 1)),
    factor: cvPercent => Math.exp(normal(0, Math.sqrt(Math.log(1 + (cvPercent / 100) ** 2)))),
    chance: probability => next() < probability,
    pick: list => list[Math.floor(next() * list.length)]!,
  }
}

function hashOf(text: string): number {
  let hash = 0x811C9DC5
  for (const byte of new TextEncoder().encode(text)) hash = Math.imul(hash ^ byte, 0x01000193)
  return hash
}
