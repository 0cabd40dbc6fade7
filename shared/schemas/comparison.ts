import { z } from 'zod'
import type { ComparisonSettings } from '../science/verdict/settings'
import { idField, requiredText } from './fields'
import { timeWindowSchema } from './method'
import { sides } from './sample'

const limit = (low: number, high: number) => z.number({ error: 'Please give a number.' }).min(low, `At least ${low}.`).max(high, `At most ${high}.`)

/** Limits and choices of a comparison, as a page sends them: all of them. */
export const comparisonSettingsSchema = z.object({
  normaliseByAmount: z.boolean(),
  blankRatio: limit(1, 1000),
  presence: limit(0.01, 1),
  reachLimit: limit(1, 1000),
  foldLimit: limit(0, 20),
  alpha: limit(1e-9, 0.5),
  assumedCvPercent: limit(0.1, 200),
  intensityLimit: z.number({ error: 'Please give a number.' }).positive('Must be greater than 0.').max(1e15).nullable(),
  divertWindows: z.array(timeWindowSchema).max(10),
  test: z.literal('welch'),
  setAsideByHand: z.array(z.object({ index: z.number().int().min(0), reason: requiredText(500) })).max(5000),
}) satisfies z.ZodType<ComparisonSettings>

/** Sides by hand: the id of a sample, and its side (null: in neither). Samples not named keep the side of the sample sheet. */
const sidesSchema = z.record(z.string().max(60), z.enum(sides).nullable())

export const newComparisonSchema = z.object({
  alignmentId: idField,
  /** Empty: made from the sides' names. */
  title: z.string().trim().max(160, 'At most 160 characters.').default(''),
  /** Seen by oneself alone; forced where the alignment is a practice run. */
  practice: z.boolean().default(false),
  sides: sidesSchema.default({}),
  sideAName: requiredText(60).optional(),
  sideBName: requiredText(60).optional(),
  /** What differs from the defaults (the method's divert windows among them). */
  settings: comparisonSettingsSchema.partial().default({}),
})
export type NewComparisonInput = z.infer<typeof newComparisonSchema>

export const newVersionSchema = z.object({
  /** The version it starts from. */
  from: z.number().int().min(1),
  settings: comparisonSettingsSchema,
  sides: sidesSchema.default({}),
  sideAName: requiredText(60).optional(),
  sideBName: requiredText(60).optional(),
  /** Another alignment of the study; else the one it starts from. */
  alignmentId: idField.optional(),
  /** Take amounts and all else from the sample sheet as it is now; else as they were in `from`. */
  useSheet: z.boolean().default(false),
  /** Look into the traces that stand now, or into none; else as the version it starts from. */
  useTraces: z.boolean().optional(),
})
export type NewVersionInput = z.infer<typeof newVersionSchema>

export const versionQuerySchema = z.object({ version: z.coerce.number().int().min(1).optional() })

/** So many features are extracted from raw data in one request. */
export const MOST_EXTRACTED = 12

const featurePlaces = z.string({ error: 'Name the features, as in “0.7.12”.' }).regex(/^\d{1,9}(?:\.\d{1,9})*$/, 'Name the features, as in “0.7.12”.')
  .transform(text => text.split('.').map(Number)).refine(places => places.length <= MOST_EXTRACTED, `At most ${MOST_EXTRACTED} features at once.`)

/** Places in the alignment, joined by points: whose traces to extract. */
export const sharedExtractQuerySchema = z.object({ features: featurePlaces })
export const extractQuerySchema = versionQuerySchema.extend({ features: featurePlaces })
export type ExtractQuery = z.output<typeof extractQuerySchema>

export const changesQuerySchema = z.object({
  version: z.coerce.number().int().min(1).optional(),
  /** The version to compare with, of this comparison or of `againstComparison`; else the one before. */
  against: z.coerce.number().int().min(1).optional(),
  againstComparison: idField.optional(),
})
