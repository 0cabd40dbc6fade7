/**
 * The k-th smallest number (from 0), by quickselect with the median of three as the pivot (Hoare 1961). Reorders the values so
 * that those before k are no greater and those after no less. No value may be NaN.
 */
export function select(values: Float64Array, k: number): number {
  let low = 0
  let high = values.length - 1
  while (low < high) {
    const pivot = middleOfThree(values[low]!, values[(low + high) >> 1]!, values[high]!)
    let i = low
    let j = high
    while (i <= j) {
      while (values[i]! < pivot) i++
      while (values[j]! > pivot) j--
      if (i > j) break
      const swap = values[i]!
      values[i++] = values[j]!
      values[j--] = swap
    }
    if (k <= j) high = j
    else if (k >= i) low = i
    else break
  }
  return values[k]!
}

function middleOfThree(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c))
}
