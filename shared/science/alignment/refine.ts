import { ascendingOrder } from '../numeric/ascendingOrder'
import { median } from '../numeric/median'
import type { Groups } from './correspondence'
import type { FeatureStack } from './stack'

/** Most groups that a table is fitted to. */
export const mostConsensusGroups = 2000
/** With this many that splitting alone made, crowded pieces need not be settled to refine the times. */
export const enoughConsensusGroups = 1000

/** Points that one table is fitted to: its features in widely shared groups. Ascending by minutes. */
export interface ConsensusPoints {
  /** The table's own minutes. */
  minutes: Float64Array
  /** Its corrected minutes so far minus the group's median time. */
  shiftMinutes: Float64Array
}

/** Groups present in more than half of the tables, at least two; at most 2,000, evenly over time. */
export function consensusGroups({ items, starts, groups }: Groups, minutes: Float64Array, tables: number): Int32Array {
  const fewest = Math.max(2, Math.floor(tables / 2) + 1)
  const wide: number[] = []
  for (let g = 0; g < groups; g++) if (starts[g + 1]! - starts[g]! >= fewest) wide.push(g)
  const order = ascendingOrder(Float64Array.from(wide, g => groupMedian(items, starts, g, minutes)))
  const kept = Math.min(order.length, mostConsensusGroups)
  return Int32Array.from({ length: kept }, (_, i) => wide[order[Math.floor(i * order.length / kept)]!]!)
}

/** Per canonical table number, the points it is fitted to. */
export function consensusPoints(
  stack: FeatureStack, found: Groups, minutes: Float64Array, chosen: Int32Array,
): ConsensusPoints[] {
  const { items, starts } = found
  const features: number[][] = Array.from(stack.inputPosition, () => [])
  const targets: number[][] = Array.from(stack.inputPosition, () => [])
  for (const g of chosen) {
    const target = groupMedian(items, starts, g, minutes)
    for (let i = starts[g]!; i < starts[g + 1]!; i++) {
      const table = stack.table[items[i]!]!
      features[table]!.push(items[i]!)
      targets[table]!.push(target)
    }
  }
  return features.map((own, table) => {
    const order = ascendingOrder(Float64Array.from(own, feature => stack.rawMinutes[feature]!))
    const read = (value: (feature: number, position: number) => number) => Float64Array.from(order, position => value(own[position]!, position))
    return {
      minutes: read(feature => stack.rawMinutes[feature]!),
      shiftMinutes: read((feature, position) => minutes[feature]! - targets[table]![position]!),
    }
  })
}

function groupMedian(items: Int32Array, starts: Int32Array, group: number, minutes: Float64Array): number {
  return median(Float64Array.from(items.subarray(starts[group]!, starts[group + 1]!), item => minutes[item]!))
}
