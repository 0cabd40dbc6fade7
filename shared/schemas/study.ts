import { z } from 'zod'
import { idField, optionalText, requiredText } from './fields'
import { methodSchema } from './method'

export const studySchema = z.object({
  title: requiredText(160),
  question: optionalText(),
  matrix: optionalText(200),
  sideAName: requiredText(60).default('A'),
  sideBName: requiredText(60).default('B'),
  methodId: idField,
  restricted: z.boolean().default(false),
})
export type StudyInput = z.infer<typeof studySchema>

/** The study form: a method of the list, or a new one made with the study. */
export const studyFormSchema = studySchema.extend({
  methodId: idField.nullable().default(null),
  newMethod: methodSchema.nullable().default(null),
}).refine(input => input.methodId !== null || input.newMethod !== null, { error: 'Choose a method, or make a new one.', path: ['methodId'] })
export type StudyFormInput = z.infer<typeof studyFormSchema>

export const studyListQuerySchema = z.object({
  search: z.string().max(200).default(''),
  archived: z.enum(['true', 'false']).default('false').transform(text => text === 'true'),
})
export type StudyListQuery = z.infer<typeof studyListQuerySchema>
