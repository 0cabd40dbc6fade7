import { sampleFields } from '#shared/schemas/sample'
import type { CellView, RowView } from './sheetRows'

/** The rows of `next`, with the very objects of `before` where nothing about them changed: only the others are drawn again. */
export function reuseRows(before: readonly RowView[], next: readonly RowView[]): RowView[] {
  const byKey = new Map(before.map(row => [row.key, row]))
  return next.map((row) => {
    const old = byKey.get(row.key)
    return old && sameRow(old, row) ? old : row
  })
}

const sameRow = (a: RowView, b: RowView) =>
  a.sampleId === b.sampleId && a.state === b.state && a.empty === b.empty && a.tables === b.tables && a.aligned === b.aligned
  && sampleFields.every(field => sameCell(a.cells[field], b.cells[field]))

/** What stands on the other side is part of the sentence. */
const sameCell = (a: CellView, b: CellView) => a.text === b.text && a.state === b.state && a.sentence === b.sentence && a.value === b.value
