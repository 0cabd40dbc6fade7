import { massFloorDa } from '../mass/tolerance'
import { select } from '../numeric/select'
import type { AlignmentSettings } from './settings'
import type { FeatureTable } from './types'

/** How many of a table's most intense features may become landmarks. */
export const landmarkFeatures = 1500

/** The most intense features of a table, ascending by m/z. */
export interface BrightFeatures {
  mz: Float64Array
  minutes: Float64Array
}

/** Features that a table and the reference certainly share: each the other's only match. Ascending by minutes. */
export interface Landmarks {
  /** The table's own minutes. */
  minutes: Float64Array
  /** Table minus reference. */
  shiftMinutes: Float64Array
  /** Table minus reference, ppm of the reference. */
  offsetPpm: Float64Array
}

/** The `landmarkFeatures` most intense features of a table; ties by lower m/z, then earlier time. */
export function brightFeatures(table: FeatureTable): BrightFeatures {
  const { mz, retentionMinutes } = table
  const rows = brightRows(table)
  const byMass = rows.sort((a, b) => mz[a]! - mz[b]! || retentionMinutes[a]! - retentionMinutes[b]! || a - b)
  return {
    mz: Float64Array.from(byMass, row => mz[row]!),
    minutes: Float64Array.from(byMass, row => retentionMinutes[row]!),
  }
}

function brightRows({ mz, retentionMinutes, intensity }: FeatureTable): number[] {
  const count = intensity.length
  if (count <= landmarkFeatures) return Array.from(intensity.keys())
  const least = select(intensity.slice(), count - landmarkFeatures)
  const above: number[] = []
  const level: number[] = []
  intensity.forEach((value, row) => {
    if (value > least) above.push(row)
    else if (value === least) level.push(row)
  })
  level.sort((a, b) => mz[a]! - mz[b]! || retentionMinutes[a]! - retentionMinutes[b]! || a - b)
  return [...above, ...level.slice(0, landmarkFeatures - above.length)]
}

/** Pairs within twice the mass tolerance and the wide time window, each the only such match of the other. */
export function findLandmarks(table: BrightFeatures, reference: BrightFeatures, settings: AlignmentSettings): Landmarks {
  const matchOfTable = new Int32Array(table.mz.length).fill(-1)
  const matchOfReference = new Int32Array(reference.mz.length).fill(-1)
  const floor = 2 * (settings.massFloorDa ?? massFloorDa(settings.alignMassPpm))
  const share = 2 * settings.alignMassPpm * 1e-6
  let low = 0
  for (let i = 0; i < table.mz.length; i++) {
    const mz = table.mz[i]!
    const tolerance = Math.max(share * mz, floor)
    while (low < reference.mz.length && reference.mz[low]! < mz - tolerance) low++
    for (let j = low; j < reference.mz.length && reference.mz[j]! <= mz + tolerance; j++) {
      if (Math.abs(table.minutes[i]! - reference.minutes[j]!) > settings.landmarkWindowMinutes) continue
      // −2: more than one match.
      matchOfTable[i] = matchOfTable[i] === -1 ? j : -2
      matchOfReference[j] = matchOfReference[j] === -1 ? i : -2
    }
  }
  const found: number[] = []
  matchOfTable.forEach((j, i) => {
    if (j >= 0 && matchOfReference[j] === i) found.push(i)
  })
  found.sort((a, b) => table.minutes[a]! - table.minutes[b]! || a - b)
  const pairs = found.map(i => ({ i, j: matchOfTable[i]! }))
  return {
    minutes: Float64Array.from(pairs, ({ i }) => table.minutes[i]!),
    shiftMinutes: Float64Array.from(pairs, ({ i, j }) => table.minutes[i]! - reference.minutes[j]!),
    offsetPpm: Float64Array.from(pairs, ({ i, j }) => (table.mz[i]! - reference.mz[j]!) / reference.mz[j]! * 1e6),
  }
}
