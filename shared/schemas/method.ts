import { z } from 'zod'
import { optionalText, requiredText } from './fields'

export const polarities = ['negative', 'positive'] as const
export type Polarity = (typeof polarities)[number]

const minutes = z.number({ error: 'Please give minutes.' }).min(0, 'Minutes are 0 or more.').max(600, 'At most 600 minutes.')

export const timeWindowSchema = z.object({ startMinutes: minutes, endMinutes: minutes })
  .refine(window => window.endMinutes > window.startMinutes, { error: 'The end must lie after the start.', path: ['endMinutes'] })
export type TimeWindow = z.infer<typeof timeWindowSchema>

export const methodSchema = z.object({
  name: requiredText(120),
  column: optionalText(200),
  gradient: optionalText(2000),
  polarity: z.enum(polarities, { error: 'Choose negative or positive.' }),
  voidMinutes: minutes.nullable().default(null),
  divertWindows: z.array(timeWindowSchema).max(10).default([]),
  remark: optionalText(),
})
export type MethodInput = z.infer<typeof methodSchema>
