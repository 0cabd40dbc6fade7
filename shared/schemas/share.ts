import { z } from 'zod'
import { idField, optionalText } from './fields'

export const SHARE_DAYS_DEFAULT = 30
export const SHARE_DAYS_MOST = 365

/** A link to one version of a comparison, in force for so many days. */
export const shareSchema = z.object({
  versionId: idField,
  label: optionalText(200),
  days: z.number({ error: 'Please give a number of days.' }).int('A whole number of days.').min(1, 'At least 1 day.').max(SHARE_DAYS_MOST, `At most ${SHARE_DAYS_MOST} days.`).default(SHARE_DAYS_DEFAULT),
  allowExport: z.boolean().default(false),
})
export type ShareInput = z.infer<typeof shareSchema>

export const shareStates = ['inForce', 'ended', 'withdrawn'] as const
export type ShareState = (typeof shareStates)[number]
export const shareStateNames: Record<ShareState, string> = { inForce: 'in force', ended: 'ended', withdrawn: 'withdrawn' }
