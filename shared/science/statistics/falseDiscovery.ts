/**
 * False discovery rate: p-values adjusted by Benjamini & Hochberg (1995, JRSS B 57:289).
 * NaN stands for "not tested": it stays NaN and does not count. The result does not depend on the order of p-values.
 */
export function falseDiscovery(p: ArrayLike<number>): Float64Array {
  const adjusted = new Float64Array(p.length).fill(Number.NaN)
  const tested: number[] = []
  for (let i = 0; i < p.length; i++) if (!Number.isNaN(p[i]!)) tested.push(i)
  const order = Uint32Array.from(tested).sort((i, j) => p[j]! - p[i]!)
  let lowest = 1
  for (let rank = order.length; rank >= 1; rank--) {
    const i = order[order.length - rank]!
    lowest = Math.min(lowest, p[i]! * (order.length / rank))
    adjusted[i] = lowest
  }
  return adjusted
}
