import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { align } from '../../../shared/science/alignment/align'
import { alignmentDefaults } from '../../../shared/science/alignment/settings'
import type { FeatureTable } from '../../../shared/science/alignment/types'
import { canonicalGroups } from '../../support/canonicalGroups'
import { scorePairs } from '../../support/pairScore'
import { seededRandom, shuffled } from '../../support/seededRandom'
import { simulate } from '../../support/simulate'

type Row = readonly [mz: number, minutes: number, intensity: number]

function table(digest: string, rows: readonly Row[], extra: Partial<FeatureTable> = {}): FeatureTable {
  return {
    digest, blank: false, runOrder: null,
    mz: Float64Array.from(rows, row => row[0]), retentionMinutes: Float64Array.from(rows, row => row[1]), intensity: Float64Array.from(rows, row => row[2]),
    ...extra,
  }
}

const groupsOf = (tables: readonly FeatureTable[]) => {
  const { mz, members } = align(tables, alignmentDefaults)
  return Array.from(mz, (_, group) => members.map(rows => rows[group]))
}

/** The same table with its times pushed by a smooth drift and its m/z by an offset. */
const moved = (from: FeatureTable, digest: string, shift: (minutes: number) => number, offsetPpm = 0): FeatureTable => ({
  ...from, digest, mz: from.mz.map(mz => mz * (1 + offsetPpm * 1e-6)), retentionMinutes: from.retentionMinutes.map(minutes => minutes + shift(minutes)),
})

describe('awkward tables', () => {
  it('no tables, and only empty ones, make no groups', () => {
    expect(align([], alignmentDefaults)).toMatchObject({ reference: -1, members: [], crowdedPieces: 0 })
    const result = align([table('a', []), table('b', [])], alignmentDefaults)
    expect(result.mz.length).toBe(0)
    expect(result.reference).toBe(-1)
    expect(result.drift[0]?.reason).toContain('no features')
    expect(result.drift[0]?.residualMedianPpm).toBeNaN()
  })

  it('one table: each feature is a group, in order of m/z, then time', () => {
    const result = align([table('a', [[300, 5, 1], [200, 4, 1], [300, 2, 1]])], alignmentDefaults)
    expect([...result.members[0] ?? []]).toEqual([1, 2, 0])
    expect([...result.retentionMinutes]).toEqual([4, 2, 5])
    expect(result.reference).toBe(0)
  })

  it('one row beside an empty table', () => {
    expect(groupsOf([table('a', []), table('b', [[300, 5, 1]])])).toEqual([[-1, 0]])
  })

  it('one row each: together where near, apart where not, the limit included', () => {
    expect(groupsOf([table('a', [[300, 5, 1]]), table('b', [[300.001, 5.05, 1]])])).toEqual([[0, 0]])
    expect(groupsOf([table('a', [[300, 5, 1]]), table('b', [[300, 5.11, 1]])])).toEqual([[0, -1], [-1, 0]])
    expect(groupsOf([table('a', [[300, 5, 1]]), table('b', [[300.0031, 5, 1]])])).toEqual([[0, -1], [-1, 0]])
    expect(groupsOf([table('a', [[300, 1, 1]]), table('b', [[300, 1.0625, 1]])])).toEqual([[0, 0]])
  })

  it('all rows equal: one of each table a group', () => {
    const rows: Row[] = Array.from({ length: 5 }, () => [300, 5, 100])
    const result = align([table('a', rows), table('b', rows), table('c', rows)], alignmentDefaults)
    expect([...result.groupSize]).toEqual([3, 3, 3, 3, 3])
  })

  it('the same table twice: every row finds itself', () => {
    const { tables: [one] } = simulate({ tables: 1, compounds: 150 })
    if (!one) throw new Error('nothing simulated')
    const { members } = align([one, one], alignmentDefaults)
    expect(members[0]).toEqual(members[1])
  })

  it('refuses columns of different length and values that are no m/z, time or intensity, naming table and row', () => {
    const good = table('a', [[300, 5, 1]])
    expect(() => align([good, { ...good, intensity: new Float64Array(0) }], alignmentDefaults)).toThrow('Table 2: its columns differ in length')
    for (const bad of [[0, 5, 1], [Number.NaN, 5, 1], [300, -1, 1], [300, Number.POSITIVE_INFINITY, 1], [300, 5, 0], [300, 5, Number.NaN]] as const) {
      expect(() => align([good, table('b', [[300, 5, 1], bad])], alignmentDefaults)).toThrow('Table 2, row 2')
    }
  })

  it('changes none of its input', () => {
    const { tables } = simulate({ tables: 3, compounds: 120 })
    const before = structuredClone(tables)
    align(tables, alignmentDefaults)
    expect(tables).toEqual(before)
  })
})

describe('crowded places', () => {
  it('a split peak: the greater part joins the group, the lesser is left out and says so', () => {
    const result = align([table('a', [[300, 5, 9000]]), table('b', [[300, 5.04, 9000], [300, 5.01, 500]])], alignmentDefaults)
    const together = [...result.groupSize].indexOf(2)
    expect(result.members.map(rows => rows[together])).toEqual([0, 0])
    expect(result.leftOut[1]).toEqual({ rows: Int32Array.of(), groups: Int32Array.of() })
    const nearer = align([table('a', [[300, 5, 9000]]), table('b', [[300, 5.01, 9000], [300, 5.05, 500]])], alignmentDefaults)
    expect(nearer.leftOut[1]).toEqual({ rows: Int32Array.of(1), groups: Int32Array.of([...nearer.groupSize].indexOf(2)) })
  })

  it('groups within tolerance name each other as neighbours', () => {
    const rows: Row[] = [[300, 5, 9000], [300, 5.08, 8000], [400, 5, 1000]]
    const { neighbourStart, neighbourList } = align([table('a', rows), table('b', rows)], alignmentDefaults)
    expect([...neighbourStart]).toEqual([0, 1, 2, 2])
    expect([...neighbourList]).toEqual([1, 0])
  })

  it('background ions, 2,000 a table at one m/z, are settled one feature a table', () => {
    const { tables } = simulate({ tables: 4, compounds: 100, background: 2000 })
    const result = align(tables, alignmentDefaults)
    expect(result.groupSize.reduce((sum, size) => sum + size, 0)).toBe(tables.reduce((sum, one) => sum + one.mz.length, 0))
    expect(Math.max(...result.groupSize)).toBe(4)
    result.neighbourStart.slice(1).forEach((end, group) => expect(end - (result.neighbourStart[group] ?? 0)).toBeLessThanOrEqual(64))
  })
})

describe('offset and drift', () => {
  const { tables: [base] } = simulate({ tables: 1, compounds: 600, close: 0, noise: 0, seed: 5 })
  if (!base) throw new Error('nothing simulated')

  it('takes out an offset beyond 1 ppm and leaves a smaller one', () => {
    const result = align([base, moved(base, 'z1', () => 0, 3), moved(base, 'z2', () => 0, 0.8)], alignmentDefaults)
    expect(result.drift.map(drift => drift.offsetApplied)).toEqual([false, true, false])
    expect(result.drift[1]?.offsetPpm).toBeCloseTo(3, 6)
    expect(result.drift[1]?.reason).toContain('3.0 ppm')
    expect(result.drift[2]?.reason).toContain('below 1 ppm')
  })

  it('corrects a drift well beyond the tolerance, and leaves it where switched off', () => {
    const drifted = moved(base, 'z', minutes => 0.4 * Math.sin(minutes / 4) + 0.3)
    const corrected = align([base, drifted], alignmentDefaults)
    expect(corrected.groupSize.filter(size => size === 2).length / base.mz.length).toBeGreaterThan(0.98)
    const left = align([base, drifted], { ...alignmentDefaults, correctDrift: false })
    expect(left.drift[1]?.timeCorrected).toBe(false)
    expect(left.drift[1]?.reason).toContain('switched off')
    expect(left.groupSize.filter(size => size === 2).length / base.mz.length).toBeLessThan(0.5)
  })

  it('a table with too few landmarks borrows from its neighbour in run order, or says that none helped', () => {
    const few = (digest: string, runOrder: number | null): FeatureTable => {
      const drifted = moved(base, digest, () => 0.3)
      return { ...drifted, runOrder, mz: drifted.mz.slice(0, 12), retentionMinutes: drifted.retentionMinutes.slice(0, 12), intensity: drifted.intensity.slice(0, 12) }
    }
    const first = { ...base, runOrder: 1 }
    const second = { ...moved(base, 'm', () => 0.3), runOrder: 8 }
    const borrowed = align([first, second, few('z', 7)], alignmentDefaults)
    expect(borrowed.drift[2]).toMatchObject({ borrowedFrom: 1, timeCorrected: true })
    expect(borrowed.drift[2]?.reason).toContain('its neighbour')
    expect(borrowed.drift[2]?.knotShiftMinutes).toEqual(borrowed.drift[1]?.knotShiftMinutes)
    const alone = align([first, second, few('z', null)], alignmentDefaults)
    expect(alone.drift[2]).toMatchObject({ borrowedFrom: null, timeCorrected: false })
    expect(alone.drift[2]?.reason).toContain('20 are needed')
  })

  it('does not correct where landmarks follow no curve', () => {
    const random = seededRandom(2)
    const scattered = moved(base, 'z', () => (random.uniform() - 0.5) * 1.9)
    const { drift } = align([base, scattered], alignmentDefaults)
    expect(drift[1]).toMatchObject({ timeCorrected: false, borrowedFrom: null })
    expect(drift[1]?.reason).toMatch(/only \d+ % of \d+ landmarks/)
  })

  it('takes the table with most features as the reference, never a blank, unless one is picked', () => {
    const small = { ...base, digest: 's', mz: base.mz.slice(0, 300), retentionMinutes: base.retentionMinutes.slice(0, 300), intensity: base.intensity.slice(0, 300) }
    expect(align([small, { ...base, blank: true }, { ...base, digest: 'y' }, { ...base, digest: 'x' }], alignmentDefaults).reference).toBe(3)
    expect(align([small, base], { ...alignmentDefaults, referenceDigest: 's' }).reference).toBe(0)
    expect(align([{ ...base, blank: true }], alignmentDefaults).reference).toBe(0)
  })
})

describe('invariance', () => {
  it('neither the order of tables nor of rows changes a bit of the groups', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 10_000 }), fc.boolean(), (seed, rounded) => {
      const { tables } = simulate({ tables: 4, compounds: 120, background: 15, close: 0.3, seed })
      if (rounded) {
        for (const one of tables) {
          one.mz.forEach((mz, row) => one.mz[row] = Math.round(mz * 1e3) / 1e3)
          one.retentionMinutes.forEach((minutes, row) => one.retentionMinutes[row] = Math.round(minutes * 50) / 50)
        }
      }
      const random = seededRandom(seed)
      const mixed = shuffled(tables, random).map((one) => {
        const order = shuffled([...one.mz.keys()], random)
        const reorder = (values: Float64Array) => Float64Array.from(order, row => values[row] ?? Number.NaN)
        return { ...one, mz: reorder(one.mz), retentionMinutes: reorder(one.retentionMinutes), intensity: reorder(one.intensity) }
      })
      expect(canonicalGroups(mixed, align(mixed, alignmentDefaults))).toEqual(canonicalGroups(tables, align(tables, alignmentDefaults)))
    }), { numRuns: 25, seed: 4 })
  })

  it('every group holds one feature a table, all within tolerance of its centre', () => {
    const { tables } = simulate({ tables: 6, compounds: 200, background: 40, close: 0.4, jitterMinutes: 0.05, seed: 9 })
    const result = align(tables, alignmentDefaults)
    result.members.forEach((rows, position) => rows.forEach((row, group) => {
      if (row < 0) return
      const factor = result.drift[position]?.offsetApplied ? 1 + (result.drift[position]?.offsetPpm ?? 0) * 1e-6 : 1
      const centre = result.mz[group] ?? Number.NaN
      expect(Math.abs((tables[position]?.mz[row] ?? Number.NaN) / factor - centre)).toBeLessThanOrEqual(Math.max(centre * 1e-5, 0.002) + 1e-9)
      expect(Math.abs((result.correctedMinutes[position]?.[row] ?? Number.NaN) - (result.retentionMinutes[group] ?? Number.NaN))).toBeLessThanOrEqual(0.1 + 1e-9)
    }))
  })

  it('a hard set (jitter 0.04 min, as much noise as compounds, 30 % missing) is still told apart', () => {
    const { tables, truth } = simulate({ tables: 8, compounds: 500, noise: 1, missing: 0.3, jitterMinutes: 0.04, seed: 3 })
    const score = scorePairs(align(tables, { ...alignmentDefaults, retentionMinutes: 0.15 }).members, truth)
    expect(score.pairPrecision).toBeGreaterThan(0.985)
    expect(score.pairRecall).toBeGreaterThan(0.975)
  })

  it('reports its progress upward from 0 to 1', () => {
    const shares: number[] = []
    align(simulate({ tables: 3, compounds: 200 }).tables, alignmentDefaults, share => shares.push(share))
    expect(shares.length).toBeGreaterThan(5)
    shares.forEach((share, i) => expect(share).toBeGreaterThanOrEqual(shares[i - 1] ?? 0))
    expect(Math.max(...shares)).toBeLessThanOrEqual(1)
  })
})
