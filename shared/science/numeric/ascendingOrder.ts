const digitBits = 11
const buckets = 1 << digitBits
const smallLength = 200
const steps = 2 ** 32 - 1
/** Moves a key, on average, beyond which insertion gives way to a full sort. */
const mostMoves = 64

/**
 * The indices that put numbers in ascending order, about as fast as sorting the numbers themselves: a stable radix sort of
 * where each stands between least and greatest, in 2³² steps, then of the few that share a step by their full value.
 * Equal numbers keep the order of `start`.
 *
 * @param keys finite numbers; not changed
 * @param start an order to begin from (default 0, 1, 2 …), so that several keys can be sorted one after the other; not changed
 */
export function ascendingOrder(keys: Float64Array, start?: Int32Array): Int32Array {
  const order = start ? start.slice() : naturalOrder(keys.length)
  if (order.length >= smallLength) radixOrder(keys, order)
  settleRuns(keys, order)
  return order
}

function naturalOrder(length: number): Int32Array {
  const order = new Int32Array(length)
  for (let i = 0; i < length; i++) order[i] = i
  return order
}

/** Sorts the order by the step of each key, keeping it within a step. */
function radixOrder(keys: Float64Array, order: Int32Array): void {
  const length = order.length
  let least = Number.POSITIVE_INFINITY
  let greatest = Number.NEGATIVE_INFINITY
  for (let i = 0; i < length; i++) {
    const key = keys[order[i]!]!
    if (key < least) least = key
    if (key > greatest) greatest = key
  }
  const scale = steps / (greatest - least)
  // No range, or one too wide or narrow for steps: left to settleRuns.
  if (!(scale > 0 && scale < Number.POSITIVE_INFINITY)) return
  let from = new Uint32Array(2 * length)
  let to = new Uint32Array(2 * length)
  const counts = new Int32Array(3 * buckets)
  for (let i = 0; i < length; i++) {
    const index = order[i]!
    const step = Math.min(steps, (keys[index]! - least) * scale) >>> 0
    from[2 * i] = step
    from[2 * i + 1] = index
    counts[step & (buckets - 1)]!++
    counts[buckets + (step >>> digitBits & (buckets - 1))]!++
    counts[2 * buckets + (step >>> 2 * digitBits)]!++
  }
  for (let digit = 0; digit < 3; digit++) {
    const shift = digit * digitBits
    const offset = digit * buckets
    let sum = 0
    for (let b = offset; b < offset + buckets; b++) {
      const count = counts[b]!
      counts[b] = sum
      sum += count
    }
    for (let i = 0; i < 2 * length; i += 2) {
      const step = from[i]!
      const at = 2 * counts[offset + (step >>> shift & (buckets - 1))]!++
      to[at] = step
      to[at + 1] = from[i + 1]!
    }
    const swap = from
    from = to
    to = swap
  }
  for (let i = 0; i < length; i++) order[i] = from[2 * i + 1]!
}

/** Puts the nearly ordered right by insertion, which keeps equal keys in place; where it is far from ordered, by a full sort. */
function settleRuns(keys: Float64Array, order: Int32Array): void {
  const length = order.length
  let moves = 0
  let previous = Number.NEGATIVE_INFINITY
  for (let i = 0; i < length; i++) {
    const index = order[i]!
    const key = keys[index]!
    if (key >= previous) {
      previous = key
      continue
    }
    let j = i - 1
    for (; j >= 0 && keys[order[j]!]! > key; j--) order[j + 1] = order[j]!
    order[j + 1] = index
    moves += i - j
    if (moves > mostMoves * (length + smallLength)) {
      stableSort(keys, order)
      return
    }
  }
}

function stableSort(keys: Float64Array, order: Int32Array): void {
  const sorted = Array.from(order, (index, position) => ({ index, position, key: keys[index]! }))
  sorted.sort((a, b) => a.key - b.key || a.position - b.position)
  sorted.forEach((entry, i) => {
    order[i] = entry.index
  })
}
