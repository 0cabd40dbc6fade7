import { z } from 'zod'
import { idField, optionalText, requiredText } from './fields'

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
