import { ascendingOrder } from '../numeric/ascendingOrder'
import { median } from '../numeric/median'
import type { Correspondence } from './correspondence'
import { driftReason } from './driftReason'
import type { Correction } from './firstCorrection'
import type { AlignmentSettings } from './settings'
import type { FeatureStack } from './stack'
import type { AlignmentResult, FeatureTable, LeftOut, TableDrift } from './types'

/** Turns groups of stacked features into the result: groups ascending by m/z, then time; tables and rows as they were given. */
export function writeResult(
  tables: readonly FeatureTable[], stack: FeatureStack, minutes: Float64Array, found: Correspondence,
  corrections: readonly Correction[], reference: number, settings: AlignmentSettings,
): AlignmentResult {
  const { items, starts, groups } = found
  const foundMz = new Float64Array(groups)
  const foundMinutes = new Float64Array(groups)
  for (let g = 0; g < groups; g++) {
    let sumMz = 0
    let sumMinutes = 0
    for (let i = starts[g]!; i < starts[g + 1]!; i++) {
      sumMz += stack.mz[items[i]!]!
      sumMinutes += minutes[items[i]!]!
    }
    foundMz[g] = sumMz / (starts[g + 1]! - starts[g]!)
    foundMinutes[g] = sumMinutes / (starts[g + 1]! - starts[g]!)
  }
  const order = ascendingOrder(foundMz, ascendingOrder(foundMinutes))
  const rank = new Int32Array(groups)
  for (let g = 0; g < groups; g++) rank[order[g]!] = g

  const members = tables.map(() => new Int32Array(groups).fill(-1))
  const correctedMinutes = tables.map(table => new Float64Array(table.mz.length))
  const groupSize = new Int32Array(groups)
  for (let g = 0; g < groups; g++) {
    groupSize[rank[g]!] = starts[g + 1]! - starts[g]!
    for (let i = starts[g]!; i < starts[g + 1]!; i++) {
      const feature = items[i]!
      const table = stack.inputPosition[stack.table[feature]!]!
      members[table]![rank[g]!] = stack.row[feature]!
      correctedMinutes[table]![stack.row[feature]!] = minutes[feature]!
    }
  }
  const mz = Float64Array.from(order, g => foundMz[g]!)
  const retentionMinutes = Float64Array.from(order, g => foundMinutes[g]!)
  const drift = tables.map((table, position) => tableDrift(table, members[position]!, correctedMinutes[position]!, { mz, retentionMinutes, groupSize }, corrections[position]!, settings))
  return {
    mz, retentionMinutes, groupSize, members, correctedMinutes, drift, reference,
    leftOut: leftOut(tables.length, stack, found, rank),
    ...neighbours(found, rank, groups),
    crowdedPieces: found.crowdedPieces,
  }
}

function tableDrift(
  table: FeatureTable, member: Int32Array, corrected: Float64Array,
  groups: Pick<AlignmentResult, 'mz' | 'retentionMinutes' | 'groupSize'>, correction: Correction, settings: AlignmentSettings,
): TableDrift {
  const factor = correction.offsetApplied ? 1 + correction.offsetPpm * 1e-6 : 1
  const errorsPpm = new Float64Array(table.mz.length)
  const errorsMinutes = new Float64Array(table.mz.length)
  let count = 0
  for (let g = 0; g < member.length; g++) {
    const row = member[g]!
    if (row < 0 || groups.groupSize[g]! < 2) continue
    errorsPpm[count] = (table.mz[row]! / factor - groups.mz[g]!) / groups.mz[g]! * 1e6
    errorsMinutes[count++] = Math.abs(corrected[row]! - groups.retentionMinutes[g]!)
  }
  const ppm = errorsPpm.subarray(0, count)
  return {
    offsetPpm: correction.offsetPpm,
    offsetApplied: correction.offsetApplied,
    landmarks: correction.refinedOn > 0 ? correction.refinedOn : correction.landmarks,
    timeCorrected: correction.curve.knotMinutes.length > 0,
    borrowedFrom: correction.borrowedFrom,
    reason: driftReason(correction, settings),
    knotMinutes: correction.curve.knotMinutes.slice(),
    knotShiftMinutes: correction.curve.knotShiftMinutes.slice(),
    residualMedianPpm: median(ppm.map(Math.abs)),
    residualMedianMinutes: median(errorsMinutes.subarray(0, count)),
    massErrorPpm: median(ppm),
  }
}

function leftOut(tables: number, stack: FeatureStack, { notes }: Correspondence, rank: Int32Array): LeftOut[] {
  const entries = notes.leftOutFeature.map((feature, i) => ({
    table: stack.inputPosition[stack.table[feature]!]!, row: stack.row[feature]!, group: rank[notes.leftOutGroup[i]!]!,
  }))
  const perTable: typeof entries[] = Array.from({ length: tables }, () => [])
  for (const entry of entries) perTable[entry.table]!.push(entry)
  return perTable.map((own) => {
    own.sort((a, b) => a.group - b.group || a.row - b.row)
    return { rows: Int32Array.from(own, entry => entry.row), groups: Int32Array.from(own, entry => entry.group) }
  })
}

function neighbours({ notes }: Correspondence, rank: Int32Array, groups: number): Pick<AlignmentResult, 'neighbourStart' | 'neighbourList'> {
  const neighbourStart = new Int32Array(groups + 1)
  for (const group of notes.group) neighbourStart[rank[group]! + 1]!++
  for (let g = 0; g < groups; g++) neighbourStart[g + 1]! += neighbourStart[g]!
  const next = neighbourStart.slice()
  const neighbourList = new Int32Array(notes.neighbour.length)
  notes.group.forEach((group, i) => {
    neighbourList[next[rank[group]!]!++] = rank[notes.neighbour[i]!]!
  })
  return { neighbourStart, neighbourList }
}
