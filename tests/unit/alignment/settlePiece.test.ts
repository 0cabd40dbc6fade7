import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Clusters } from '../../../shared/science/alignment/clusters'
import { ElutionOrder } from '../../../shared/science/alignment/elutionOrder'
import { MergeQueue } from '../../../shared/science/alignment/mergeQueue'
import { Partners } from '../../../shared/science/alignment/partners'
import { alignmentDefaults } from '../../../shared/science/alignment/settings'
import { mostRefusals, settlePiece } from '../../../shared/science/alignment/settlePiece'
import { bruteAgglomeration, type PlainFeature } from '../../support/bruteAgglomeration'

const tables = 40

function settle(features: readonly PlainFeature[], most = mostRefusals): number[][] {
  const clusters = new Clusters(alignmentDefaults, tables)
  const column = (read: (feature: PlainFeature) => number) => Float64Array.from(features, read)
  const items = Int32Array.from(features.keys())
  clusters.load(column(f => f.mz), column(f => f.minutes), Int32Array.from(features, f => f.table), items, 0, features.length)
  const intensity = Float64Array.from(clusters.rank.subarray(0, features.length), rank => features[rank]?.intensity ?? Number.NaN)
  settlePiece({ clusters, queue: new MergeQueue(), partners: new Partners(), elution: new ElutionOrder(tables), mostRefusals: most }, intensity)
  const groups: number[][] = []
  for (let c = 0; c < features.length; c++) {
    if (clusters.alive[c] === 0) continue
    const members: number[] = []
    for (let member = c; member >= 0; member = clusters.nextMember[member] ?? -1) members.push(clusters.rank[member] ?? -1)
    groups.push(members.sort((a, b) => a - b))
  }
  return groups.sort((a, b) => (a[0] ?? 0) - (b[0] ?? 0))
}

const canonical = (features: PlainFeature[]) =>
  features.sort((a, b) => a.mz - b.mz || a.minutes - b.minutes || a.table - b.table || b.intensity - a.intensity)

/** Crowded on purpose: coarse steps make ties, a narrow range makes neighbours, few tables make split peaks and crossings. */
const crowd = (massSteps: number, timeSteps: number, tableCount: number) => fc.array(fc.record({
  mz: fc.integer({ min: 0, max: massSteps }).map(step => 300 + step * 0.0007),
  minutes: fc.integer({ min: 0, max: timeSteps }).map(step => 5 + step * 0.013),
  intensity: fc.integer({ min: 1, max: 5 }).map(step => step * 1000),
  table: fc.integer({ min: 0, max: tableCount - 1 }).map(table => table * 7 % tables),
}), { minLength: 2, maxLength: 26 }).map(canonical)

describe('settlePiece', () => {
  it.each([[8, 30, 4], [2, 60, 6], [60, 6, 5], [20, 12, 10], [0, 40, 3]])('does what trying every pair does (%i m/z steps, %i time steps, %i tables)', (massSteps, timeSteps, tableCount) => {
    fc.assert(fc.property(crowd(massSteps, timeSteps, tableCount), (features) => {
      expect(settle(features)).toEqual(bruteAgglomeration(features, alignmentDefaults, mostRefusals))
      expect(settle(features, 1)).toEqual(bruteAgglomeration(features, alignmentDefaults, 1))
    }), { numRuns: 300, seed: 7 })
  })

  it('settles a split peak after its greater part', () => {
    const features = canonical([
      { mz: 300, minutes: 5.00, intensity: 9000, table: 0 },
      { mz: 300, minutes: 5.03, intensity: 1000, table: 0 },
      { mz: 300, minutes: 5.03, intensity: 9000, table: 1 },
    ])
    // The lesser part is nearer, yet the two greater ones belong together.
    expect(settle(features)).toEqual([[0, 2], [1]])
  })

  it('keeps features of one m/z in order of elution', () => {
    const features = canonical([
      { mz: 300, minutes: 5.000, intensity: 5000, table: 0 },
      { mz: 300, minutes: 5.060, intensity: 5000, table: 1 },
      { mz: 300, minutes: 5.061, intensity: 4000, table: 0 },
      { mz: 300, minutes: 5.002, intensity: 4000, table: 1 },
    ])
    const groups = settle(features)
    for (const a of groups) {
      for (const b of groups) {
        const signs = a.flatMap(i => b.filter(j => j !== i && features[j]?.table === features[i]?.table).map(j => Math.sign((features[j]?.minutes ?? 0) - (features[i]?.minutes ?? 0))))
        expect(new Set(signs).size).toBeLessThanOrEqual(1)
      }
    }
  })
})
