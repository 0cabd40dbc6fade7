import { z } from 'zod'
import { idField, requiredText } from './fields'

export const flagKinds = ['ofInterest', 'oneSideOnly', 'contaminant', 'artefact', 'askAgain'] as const
export type FlagKind = (typeof flagKinds)[number]
export const flagKindNames: Record<FlagKind, string> = {
  ofInterest: 'of interest',
  oneSideOnly: 'one side only',
  contaminant: 'contaminant',
  artefact: 'artefact',
  askAgain: 'ask again',
}

/** As many as one act may flag or take back. */
export const FLAGS_AT_ONCE = 1000

/** One flag, with one reason, on one feature or on many at once. */
export const flagSchema = z.object({
  featureIndexes: z.array(z.number().int().min(0)).min(1, 'Choose a feature.').max(FLAGS_AT_ONCE, `At most ${FLAGS_AT_ONCE} features at once.`),
  kind: z.enum(flagKinds, { error: 'Choose a kind of flag.' }),
  reason: requiredText(500),
})
export type FlagInput = z.infer<typeof flagSchema>

/** Taking flags back, or setting them again. */
export const flagChangeSchema = z.object({
  flagIds: z.array(idField).min(1, 'Choose a flag.').max(FLAGS_AT_ONCE),
  takenBack: z.boolean(),
})
export type FlagChange = z.infer<typeof flagChangeSchema>
