const digitBits = 11
const digits = 6
const buckets = 1 << digitBits
const smallLength = 400

/**
 * The indices that put numbers in ascending order: a stable radix sort of their 64 bits, about as fast as sorting
 * the numbers themselves. Equal numbers keep the order of `start`.
 *
 * @param keys finite numbers; not changed
 * @param start an order to begin from (default 0, 1, 2 …), so that several keys can be sorted one after the other; not changed
 */
export function ascendingOrder(keys: Float64Array, start?: Int32Array): Int32Array {
  const order = start ? start.slice() : naturalOrder(keys.length)
  return order.length < smallLength ? smallOrder(keys, order) : radixOrder(keys, order)
}

function naturalOrder(length: number): Int32Array {
  const order = new Int32Array(length)
  for (let i = 0; i < length; i++) order[i] = i
  return order
}

function smallOrder(keys: Float64Array, order: Int32Array): Int32Array {
  const place = Array.from(order, (index, position) => ({ index, position, key: keys[index]! }))
  place.sort((a, b) => a.key - b.key || a.position - b.position)
  return Int32Array.from(place, entry => entry.index)
}

function radixOrder(keys: Float64Array, order: Int32Array): Int32Array {
  const length = order.length
  const words = sortableWords(keys)
  let from: Int32Array = order
  let to: Int32Array = new Int32Array(length)
  const counts = new Int32Array(buckets)
  for (let digit = 0; digit < digits; digit++) {
    const shift = digit * digitBits
    // A digit may straddle the two words of a number: take its low part from one and the rest from the other.
    const word = shift >> 5
    const offset = shift & 31
    const spill = offset + digitBits > 32 && word === 0 ? 32 - offset : 0
    counts.fill(0)
    for (let i = 0; i < length; i++) {
      const at = from[i]! * 2
      counts[readDigit(words, at, word, offset, spill)]!++
    }
    if (counts.includes(length)) continue
    let sum = 0
    for (let b = 0; b < buckets; b++) {
      const count = counts[b]!
      counts[b] = sum
      sum += count
    }
    for (let i = 0; i < length; i++) {
      const index = from[i]!
      const bucket = readDigit(words, index * 2, word, offset, spill)
      to[counts[bucket]!++] = index
    }
    const swap = from
    from = to
    to = swap
  }
  return from
}

function readDigit(words: Uint32Array, at: number, word: number, offset: number, spill: number): number {
  const low = words[at + word]! >>> offset
  return (spill > 0 ? low | (words[at + 1]! << spill) : low) & (buckets - 1)
}

/** Low and high word of each number, flipped so that unsigned order is numeric order. */
function sortableWords(keys: Float64Array): Uint32Array {
  const words = new Uint32Array(new Float64Array(keys).buffer)
  for (let i = 0; i < words.length; i += 2) {
    const low = words[i]!
    const high = words[i + 1]!
    const negative = high >>> 31 === 1
    // −0 and 0 are the same number and must stay in their given order.
    if (negative && low === 0 && high === 0x80000000) words[i + 1] = 0x80000000
    else {
      words[i] = negative ? ~low : low
      words[i + 1] = negative ? ~high : high | 0x80000000
    }
  }
  return words
}
