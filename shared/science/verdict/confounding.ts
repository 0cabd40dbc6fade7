interface PlacedSample { side: 'A' | 'B' | null, runOrder: number | null, batch: string | null }

/**
 * Do the sides follow run order: every injection of one side ran before every injection of the other, with at least two a side
 * that state their run order? Then a drift of the instrument looks like a difference of the sides.
 */
export function sidesFollowRunOrder(samples: readonly PlacedSample[]): boolean {
  const order = (side: 'A' | 'B') => samples.flatMap(sample => sample.side === side && sample.runOrder !== null ? [sample.runOrder] : [])
  const a = order('A')
  const b = order('B')
  if (a.length < 2 || b.length < 2) return false
  return Math.max(...a) < Math.min(...b) || Math.max(...b) < Math.min(...a)
}

/** Do the sides follow batch: both sides state their batches, and none of them holds both? */
export function sidesFollowBatch(samples: readonly PlacedSample[]): boolean {
  const batches = (side: 'A' | 'B') => new Set(samples.flatMap(sample => sample.side === side && sample.batch ? [sample.batch] : []))
  const a = batches('A')
  const b = batches('B')
  return a.size > 0 && b.size > 0 && ![...a].some(batch => b.has(batch))
}
