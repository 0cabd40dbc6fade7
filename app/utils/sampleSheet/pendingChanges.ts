import { sampleFields, sampleSchema, type SampleField } from '#shared/schemas/sample'
import type { SheetChanges } from '#shared/schemas/sheet'
import type { SheetDraft } from './draft'
import type { RowView } from './sheetRows'

/** Changes for the server, and the texts they were made from: what is typed meanwhile is told apart by them. */
export interface PendingChanges { changes: SheetChanges, texts: { key: string, field: SampleField, text: string }[] }

/** All that can be saved now: cells that can be read, new rows that have a name, rows to delete. Null where there is nothing. */
export function pendingChanges(rows: readonly RowView[], draft: SheetDraft): PendingChanges | null {
  const changes: SheetChanges = { edits: [], added: [], removed: Object.entries(draft.removed).map(([sampleId, from]) => ({ sampleId, from })) }
  const texts: PendingChanges['texts'] = []
  for (const row of rows) {
    const waiting = sampleFields.filter(field => row.cells[field].state === 'waiting')
    if (row.state === 'standing' && row.sampleId) {
      for (const field of waiting) {
        const from = draft.typed[row.key]?.[field]?.from
        const to = row.cells[field].value
        if (from !== undefined && to !== undefined) changes.edits.push({ sampleId: row.sampleId, field, from, to })
      }
    }
    else if (row.state === 'new' && waiting.includes('name')) {
      const sample = sampleSchema.safeParse(Object.fromEntries(waiting.map(field => [field, row.cells[field].value])))
      if (sample.success) changes.added.push({ key: row.key, sample: sample.data })
    }
    else continue
    texts.push(...waiting.map(field => ({ key: row.key, field, text: row.cells[field].text })))
  }
  const nothing = changes.edits.length + changes.added.length + changes.removed.length === 0
  return nothing ? null : { changes, texts }
}
