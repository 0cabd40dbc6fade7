import { z } from 'zod'

export const sampleKinds = ['sample', 'solventBlank', 'processBlank', 'pooledQc', 'standard'] as const
export type SampleKind = (typeof sampleKinds)[number]
export const sampleKindNames: Record<SampleKind, string> = {
  sample: 'sample',
  solventBlank: 'solvent blank',
  processBlank: 'process blank',
  pooledQc: 'pooled QC',
  standard: 'standard',
}

/** A blank is never a side, and never the reference of an alignment. */
export const isBlank = (kind: SampleKind | null) => kind === 'solventBlank' || kind === 'processBlank'

export const sides = ['A', 'B'] as const
export type Side = (typeof sides)[number]

export const amountUnits = ['mg', 'mL'] as const
export type AmountUnit = (typeof amountUnits)[number]

/** Bounds far beyond any bench, so that no product or quotient of them is infinite. */
const positiveOrNull = z.number({ error: 'Not a number.' }).positive('Must be greater than 0.').min(1e-6, 'Too small.').max(1e9, 'Too large.').nullable()

/** What a person may write into one row of the sample sheet. */
export const sampleSchema = z.object({
  name: z.string().trim().min(1, 'A sample needs a name.').max(120, 'At most 120 characters.'),
  kind: z.enum(sampleKinds, { error: 'sample, solvent blank, process blank, pooled QC or standard.' }).default('sample'),
  side: z.enum(sides, { error: 'A, B or empty.' }).nullable().default(null),
  preparation: z.string().trim().max(120, 'At most 120 characters.').default(''),
  amount: positiveOrNull.default(null),
  amountUnit: z.enum(amountUnits, { error: 'mg or mL.' }).default('mg'),
  volumeMl: positiveOrNull.default(null),
  dilution: positiveOrNull.default(null),
  injectionUl: positiveOrNull.default(null),
  runOrder: z.number({ error: 'Not a number.' }).int('A whole number.').min(0, '0 or more.').max(100_000).nullable().default(null),
  batch: z.string().trim().max(120, 'At most 120 characters.').default(''),
})
export type SampleInput = z.infer<typeof sampleSchema>
export type SampleField = keyof SampleInput

/** The columns of the sample sheet, in their order. */
export const sampleFields = ['name', 'kind', 'side', 'preparation', 'amount', 'amountUnit', 'volumeMl', 'dilution', 'injectionUl', 'runOrder', 'batch'] as const satisfies readonly SampleField[]
