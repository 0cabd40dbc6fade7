import { z } from 'zod'
import { idField } from './fields'
import { sampleFields, sampleSchema, type SampleField } from './sample'

/** What stands in a cell of the sample sheet: text, a number, or nothing. */
export const cellValueSchema = z.union([z.string().max(2000), z.number(), z.null()])
export type CellValue = z.infer<typeof cellValueSchema>

const cellEditSchema = z.object({
  sampleId: idField,
  field: z.enum(sampleFields),
  /** What the person saw there before. Where something else stands by now, the edit is a conflict and is not made. */
  from: cellValueSchema,
  to: cellValueSchema,
})
export type CellEdit = z.infer<typeof cellEditSchema>

/** What one person changed in the sheet since it was last saved. */
export const sheetChangesSchema = z.object({
  edits: z.array(cellEditSchema).max(20_000).default([]),
  /** New rows, for the end of the sheet; `key` is what the page calls them until they have an id. */
  added: z.array(z.object({ key: z.string().min(1).max(40), sample: sampleSchema })).max(2000, 'At most 2000 new rows at once.').default([]),
  /** Rows to delete, as the person saw them. */
  removed: z.array(z.object({ sampleId: idField, from: sampleSchema })).max(5000).default([]),
}).superRefine(({ edits }, context) => {
  edits.forEach(({ field, to }, index) => {
    const issue = sampleSchema.shape[field].safeParse(to).error?.issues[0]
    if (issue) context.addIssue({ code: 'custom', path: ['edits', index, 'to'], message: issue.message })
  })
})
export type SheetChanges = z.infer<typeof sheetChangesSchema>

/** The value as the sheet keeps it, for an edit that has passed its schema. */
export function parseCell(field: SampleField, value: CellValue): CellValue {
  return sampleSchema.shape[field].parse(value)
}
