import { sampleFields, type SampleField } from '#shared/schemas/sample'
import type { RowView } from './sheetRows'

/** A place in the sheet that waits for the person. `field` is null where it is a whole row. */
export interface Need { id: string, row: RowView, rowName: string, field: SampleField | null, sentence: string, changed: boolean }

export function needsOf(rows: readonly RowView[]): Need[] {
  return rows.flatMap((row, index): Need[] => {
    const rowName = row.cells.name.text.trim() || `Row ${index + 1}`
    if (row.state === 'gone') {
      return [{ id: row.key, row, rowName, field: null, changed: false, sentence: 'Deleted by someone else while you typed in it. What you typed is still here.' }]
    }
    return sampleFields.filter(field => row.cells[field].sentence !== '').map(field => ({
      id: `${row.key} ${field}`,
      row,
      rowName,
      field,
      sentence: `${row.cells[field].state === 'changed' || row.cells[field].text === '' ? '' : `“${row.cells[field].text}”. `}${row.cells[field].sentence}`,
      changed: row.cells[field].state === 'changed',
    }))
  })
}
