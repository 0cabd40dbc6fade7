import { z } from 'zod'
import { requiredText } from './fields'

export const flagKinds = ['ofInterest', 'oneSideOnly', 'contaminant', 'artefact', 'askAgain'] as const
export type FlagKind = (typeof flagKinds)[number]
export const flagKindNames: Record<FlagKind, string> = {
  ofInterest: 'of interest',
  oneSideOnly: 'one side only',
  contaminant: 'contaminant',
  artefact: 'artefact',
  askAgain: 'ask again',
}

export const flagSchema = z.object({
  featureIndex: z.number().int().min(0),
  kind: z.enum(flagKinds, { error: 'Choose a kind of flag.' }),
  reason: requiredText(500),
})
export type FlagInput = z.infer<typeof flagSchema>
