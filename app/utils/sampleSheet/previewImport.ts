import { sheetColumns } from '#shared/formats/sampleSheet/columns'
import { readSheetCsv, type CellTexts } from '#shared/formats/sampleSheet/readBlock'
import { readCell, type SideNames } from '#shared/formats/sampleSheet/readCell'
import { nameKey } from './placeBlock'

export interface ImportProblem { line: number, column: string, text: string, sentence: string }

export interface ImportPreview {
  /** The rows that come in. */
  rows: CellTexts[]
  /** How many are new, and how many change samples that stand. */
  added: number
  changed: number
  /** Rows that are left out. */
  refused: ImportProblem[]
  /** Cells that come in as they are, marked, to be corrected in the sheet. */
  marked: ImportProblem[]
  unknown: string[]
}

/** What a CSV file would bring into a sheet that holds the names `standing` (as nameKey has them). Null where it names no columns. */
export function previewImport(text: string, standing: ReadonlySet<string>, names: SideNames): ImportPreview | null {
  const block = readSheetCsv(text)
  if (!block) return null
  const preview: ImportPreview = { rows: [], added: 0, changed: 0, refused: [], marked: [], unknown: block.unknown }
  const seen = new Map<string, number>()
  for (const { line, cells } of block.rows) {
    const name = cells.name ?? ''
    const earlier = seen.get(nameKey(name))
    const sentence = name.trim() === '' ? 'A sample needs a name.' : earlier === undefined ? null : `Line ${earlier} has this name already.`
    if (sentence) {
      preview.refused.push({ line, column: 'name', text: name, sentence })
      continue
    }
    seen.set(nameKey(name), line)
    preview.rows.push(cells)
    if (standing.has(nameKey(name))) preview.changed++
    else preview.added++
    for (const { field, label } of sheetColumns) {
      const cell = cells[field]
      const read = cell ? readCell(field, cell, names) : { value: null }
      if (cell && 'sentence' in read) preview.marked.push({ line, column: label, text: cell, sentence: read.sentence })
    }
  }
  return preview
}
