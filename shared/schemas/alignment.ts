import { z } from 'zod'
import { alignmentDefaults } from '../science/alignment/settings'
import { idField } from './fields'

const number = (least: number, most: number, unit: string) => z.number({ error: 'Please give a number.' }).min(least, `At least ${least} ${unit}.`).max(most, `At most ${most} ${unit}.`)

export const alignmentSettingsSchema = z.object({
  alignMassPpm: number(0.1, 200, 'ppm').default(alignmentDefaults.alignMassPpm),
  massFloorDa: number(0, 1, 'Da').nullable().default(alignmentDefaults.massFloorDa),
  retentionMinutes: number(0.001, 10, 'min').default(alignmentDefaults.retentionMinutes),
  landmarkWindowMinutes: number(0.01, 30, 'min').default(alignmentDefaults.landmarkWindowMinutes),
  correctOffset: z.boolean().default(alignmentDefaults.correctOffset),
  correctDrift: z.boolean().default(alignmentDefaults.correctDrift),
  referenceDigest: z.string().regex(/^[0-9a-f]{64}$/, 'Not a table of this study.').nullable().default(null),
})

export const newAlignmentSchema = z.object({
  settings: alignmentSettingsSchema,
  /** Take the rows of wide tables as they stand. */
  asGiven: z.boolean().default(false),
  /** A practice run, seen by the person who makes it. */
  practice: z.boolean().default(false),
  /** The alignment it is started from; else the latest one. */
  rerunOf: idField.nullable().default(null),
})
export type NewAlignment = z.infer<typeof newAlignmentSchema>
