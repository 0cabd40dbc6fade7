/** A small seeded generator (mulberry32): the same numbers everywhere, for tests and benchmarks only. */
export interface SeededRandom {
  /** In [0, 1). */
  uniform(): number
  /** Standard normal (Box & Muller 1958). */
  normal(): number
  /** A whole number in [0, below). */
  whole(below: number): number
}

export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0
  const uniform = () => {
    state = (state + 0x6D2B79F5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
  return {
    uniform,
    normal: () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform()),
    whole: below => Math.floor(uniform() * below),
  }
}

/** A new list in a seeded random order. */
export function shuffled<T>(values: readonly T[], random: SeededRandom): T[] {
  const list = values.slice()
  for (let i = list.length - 1; i > 0; i--) {
    const j = random.whole(i + 1)
    const swap = list[i] as T
    list[i] = list[j] as T
    list[j] = swap
  }
  return list
}
