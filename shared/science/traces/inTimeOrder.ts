import { timeOrder } from './timeOrder'

/**
 * Puts times in ascending order and columns with them: times corrected by a drift curve may cross.
 *
 * @param minutes finite; not changed
 * @param columns each as long as `minutes`; not changed
 * @returns the same arrays where they are in order already, else copies
 */
export function inTimeOrder(minutes: Float64Array, columns: readonly Float64Array[]): { minutes: Float64Array, columns: readonly Float64Array[] } {
  if (isAscending(minutes)) return { minutes, columns }
  const { order } = timeOrder(minutes)
  const sorted = (values: Float64Array) => Float64Array.from(order, i => values[i]!)
  return { minutes: sorted(minutes), columns: columns.map(sorted) }
}

function isAscending(values: Float64Array): boolean {
  for (let i = 1; i < values.length; i++) if (!(values[i]! >= values[i - 1]!)) return false
  return true
}
