import { z } from 'zod'
import { idField } from './fields'
import type { LayoutAnswers } from '../science/table/layout'

/** Bytes a feature table may have. */
export const MAX_TABLE_BYTES = 64 * 2 ** 20
/** Days that a file waits for a person's answer. */
export const WAITING_DAYS = 14
/** Under this share of empty cells a column of a wide table seems gap-filled. */
export const GAP_FILLED_SHARE = 0.01

/** The address's query of an upload: the file's name, and the table that it is to replace. */
export const uploadQuerySchema = z.object({
  name: z.string().trim().min(1, 'A file needs a name.').max(255, 'A file name has at most 255 characters.'),
  replaces: idField.optional(),
})
export type UploadQuery = z.infer<typeof uploadQuerySchema>

const column = z.number().int().min(0).max(5000)
const decimalMark = z.enum(['.', ','])
const thousandsMark = z.enum(['', ',', '.', ' ', '\''])

/** What a person says of a file's layout. */
export const layoutAnswersSchema: z.ZodType<LayoutAnswers> = z.object({
  shape: z.enum(['long', 'wide']),
  mzColumn: column,
  massKind: z.enum(['mz', 'neutral']),
  minutesColumn: column,
  timeUnit: z.enum(['minutes', 'seconds']),
  decimalMark,
  thousandsMark,
  intensityColumn: column,
  intensityDecimalMark: decimalMark,
  intensityThousandsMark: thousandsMark,
  measure: z.enum(['area', 'height', 'unknown']),
  widthColumn: column.nullable(),
  notSamples: z.array(column).max(2000),
  oneSample: z.literal(true),
}).partial()

export const uploadAnswersSchema = z.object({ answers: layoutAnswersSchema })

/** What may be changed of a table that stands: the sample it belongs to, and the peak limit of the software it comes from. */
export const tableChangeSchema = z.object({
  sampleId: idField.nullable().optional(),
  statedFloor: z.number({ error: 'Please give a number.' }).positive('Must be greater than 0.').max(1e15).nullable().optional(),
}).refine(change => change.sampleId !== undefined || change.statedFloor !== undefined, 'Nothing to change.')
export type TableChange = z.infer<typeof tableChangeSchema>
