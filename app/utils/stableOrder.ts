/** Values to sort by, and which way. NaN stands last in both directions. */
export interface SortValues { values: ArrayLike<number>, descending: boolean }

/**
 * The places 0 … `length` − 1 in the order of these keys, the first one foremost; places equal in all of them stay in their
 * own order. A radix sort over the bits of each key, the last key first: linear in `length`, without a comparison.
 */
export function stableOrder(length: number, keys: readonly SortValues[]): Int32Array {
  let order = Int32Array.from({ length }, (_, place) => place)
  let spare = new Int32Array(length)
  for (const { values, descending } of keys.toReversed()) {
    for (const bits of sortableBits(length, values, descending)) {
      for (const shift of [0, 16]) [order, spare] = sortByDigit(order, spare, bits, shift)
    }
  }
  return order
}

/** Each value as 64 bits that stand in the order of the values, low and high half. */
function sortableBits(length: number, values: ArrayLike<number>, descending: boolean): readonly [low: Uint32Array, high: Uint32Array] {
  const [low, high] = [new Uint32Array(length), new Uint32Array(length)]
  const number = new Float64Array(1)
  const halves = new Uint32Array(number.buffer)
  const turn = descending ? 0xFFFFFFFF : 0
  for (let i = 0; i < length; i++) {
    const value = values[i] ?? Number.NaN
    if (Number.isNaN(value)) {
      low[i] = high[i] = 0xFFFFFFFF
      continue
    }
    // Adding 0 makes one zero of both.
    number[0] = value + 0
    // Negative numbers turn all their bits round, the others the sign alone.
    const isNegative = halves[1]! >>> 31 === 1
    low[i] = (isNegative ? ~halves[0]! : halves[0]!) ^ turn
    high[i] = (isNegative ? ~halves[1]! : halves[1]! ^ 0x80000000) ^ turn
  }
  return [low, high]
}

const DIGITS = 0x10000

/** Sorts `order` by 16 bits of each place, into `spare`; gives the sorted one first. Where all are equal nothing is moved. */
function sortByDigit(order: Int32Array<ArrayBuffer>, spare: Int32Array<ArrayBuffer>, bits: Uint32Array, shift: number): [sorted: Int32Array<ArrayBuffer>, spare: Int32Array<ArrayBuffer>] {
  const starts = new Uint32Array(DIGITS + 1)
  for (const each of bits) starts[(each >>> shift & 0xFFFF) + 1]!++
  if (starts.indexOf(bits.length, 1) >= 0) return [order, spare]
  for (let digit = 1; digit <= DIGITS; digit++) starts[digit]! += starts[digit - 1]!
  for (const place of order) spare[starts[bits[place]! >>> shift & 0xFFFF]!++] = place
  return [spare, order]
}
