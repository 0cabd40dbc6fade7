import { expect, it } from 'vitest'
import { settingDifferences } from '../../../shared/science/alignment/settingDifferences'
import { alignmentDefaults } from '../../../shared/science/alignment/settings'

it('settings that differ are named with what they were before; the same ones are not', () => {
  expect(settingDifferences(alignmentDefaults, { ...alignmentDefaults })).toEqual([])
  expect(settingDifferences(alignmentDefaults, { ...alignmentDefaults, retentionMinutes: 0.05, massFloorDa: 0.001, correctDrift: false })).toEqual([
    'Smallest mass tolerance 0.001 Da (before: smallest mass tolerance as follows from the ppm).',
    'Time tolerance 0.05 min (before: time tolerance 0.1 min).',
    'Retention drift left (before: retention drift corrected).',
  ])
})
