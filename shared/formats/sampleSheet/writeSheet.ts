import type { SampleInput } from '../../schemas/sample'
import { writeCsv } from '../delimitedText/writeCsv'
import { cellText } from './cellText'
import { sheetColumns } from './columns'

/** The sample sheet as CSV: what readSheetCsv reads back. A unit without an amount says nothing and is left out. */
export function writeSheet(samples: readonly SampleInput[]): string {
  return writeCsv(sheetColumns.map(column => column.label), samples.map(sample => sheetColumns.map(({ field, numeric }) => {
    if (field === 'amountUnit' && sample.amount === null && sample.amountUnit === 'mg') return ''
    return numeric ? sample[field] : cellText(field, sample[field])
  })))
}

/** Cells as a spreadsheet takes them from the clipboard. */
export function writeTabbed(rows: readonly (readonly string[])[]): string {
  return rows.map(cells => cells.map(cell => /["\t\r\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell).join('\t')).join('\n')
}
