import { beforeAll, describe, expect, it } from 'vitest'
import { align } from '../../../shared/science/alignment/align'
import { alignmentDefaults } from '../../../shared/science/alignment/settings'
import type { AlignmentResult } from '../../../shared/science/alignment/types'
import { scorePairs } from '../../support/pairScore'
import { readReferenceTables, type ReferenceTables } from '../../support/referenceTables'

describe.each(['alignment', 'alignment-rough', 'alignment-two'])('the simulated tables of %s at default settings', (folder) => {
  let known: ReferenceTables
  let result: AlignmentResult
  beforeAll(() => {
    known = readReferenceTables(folder)
    result = align(known.tables, alignmentDefaults)
  })

  it('reach the figures of truth.json', () => {
    const score = scorePairs(result.members, known.truth)
    expect(score.pairPrecision).toBeGreaterThanOrEqual(known.mustReach.pairPrecision)
    expect(score.pairRecall).toBeGreaterThanOrEqual(known.mustReach.pairRecall)
  })

  it('put every row into exactly one group', () => {
    known.tables.forEach((table, position) => {
      const rows = [...result.members[position] ?? []].filter(row => row >= 0).sort((a, b) => a - b)
      expect(rows).toEqual(Array.from(table.mz.keys()))
    })
  })

  it('correct every table but the reference by a curve of its own', () => {
    result.drift.forEach((drift) => {
      expect(drift.timeCorrected).toBe(true)
      expect(drift.residualMedianMinutes).toBeLessThan(0.02)
    })
  })
})

it('the rough tables have their 4 ppm offset found and taken out', () => {
  const { drift } = align(readReferenceTables('alignment-rough').tables, alignmentDefaults)
  const offsets = drift.filter(table => table.offsetApplied).map(table => table.offsetPpm)
  expect(offsets).toHaveLength(3)
  offsets.forEach(offset => expect(Math.abs(offset + 4)).toBeLessThan(0.5))
})

it('of the one-sided groups of two tables at most 1 % are in truth in the other', () => {
  const { tables, truth } = readReferenceTables('alignment-two')
  const { members } = align(tables, alignmentDefaults)
  const compounds = truth.map(rows => new Set(rows))
  let oneSided = 0
  let wrong = 0
  for (const [side, other] of [[0, 1], [1, 0]] as const) {
    members[side]?.forEach((row, group) => {
      if (row < 0 || (members[other]?.[group] ?? -1) >= 0) return
      oneSided++
      const compound = truth[side]?.[row] ?? -1
      if (compound >= 0 && compounds[other]?.has(compound)) wrong++
    })
  }
  expect(oneSided).toBeGreaterThan(500)
  expect(wrong / oneSided).toBeLessThanOrEqual(0.01)
})
