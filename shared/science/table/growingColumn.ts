const BLOCK = 65_536

/**
 * A column of doubles that grows in blocks, so that no value is copied while it grows. With `expected` (the number of rows
 * counted before) the first block holds them all and is handed out as it is.
 */
export class GrowingFloats {
  length = 0
  private readonly first: Float64Array
  private readonly more: Float64Array[] = []
  private last: Float64Array
  private place = 0

  constructor(expected = 0) {
    this.last = this.first = new Float64Array(expected)
  }

  push(value: number): void {
    if (this.place === this.last.length) {
      this.more.push(this.last = new Float64Array(BLOCK))
      this.place = 0
    }
    this.last[this.place++] = value
    this.length++
  }

  /** NaN where there is no such value. */
  at(index: number): number {
    if (index >= this.length) return Number.NaN
    const beyond = index - this.first.length
    return (beyond < 0 ? this.first[index] : this.more[Math.floor(beyond / BLOCK)]?.[beyond % BLOCK]) ?? Number.NaN
  }

  /** All values as one array: a view of the first block where that holds them all. */
  take(): Float64Array {
    if (this.more.length === 0) return this.first.subarray(0, this.length)
    const all = new Float64Array(this.length)
    all.set(this.first)
    this.more.forEach((block, index) => all.set(block.subarray(0, this.length - this.first.length - index * BLOCK), this.first.length + index * BLOCK))
    return all
  }
}

/** Row numbers that grow in the same way. */
export class GrowingIntegers {
  length = 0
  private readonly blocks: Int32Array[] = []
  private last = new Int32Array(0)

  push(value: number): void {
    const place = this.length % BLOCK
    if (place === 0) this.blocks.push(this.last = new Int32Array(BLOCK))
    this.last[place] = value
    this.length++
  }

  take(): Int32Array {
    const all = new Int32Array(this.length)
    this.blocks.forEach((block, index) => all.set(block.subarray(0, this.length - index * BLOCK), index * BLOCK))
    return all
  }
}
