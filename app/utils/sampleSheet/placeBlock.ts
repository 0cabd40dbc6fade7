import type { CellTexts } from '#shared/formats/sampleSheet/readBlock'
import { sampleFields, type SampleField } from '#shared/schemas/sample'

export interface CellText { key: string, field: SampleField, text: string }

/** Puts rows of texts into the sheet from a row on, making as many new ones as are missing (`more` adds them and gives their keys). */
export function placeBlock(rows: readonly CellTexts[], keys: readonly string[], from: number, more: (count: number) => string[]): CellText[] {
  const here = keys.slice(from, from + rows.length)
  const all = here.length < rows.length ? [...here, ...more(rows.length - here.length)] : here
  return rows.flatMap((cells, index) => cellsAt(all[index] ?? '', cells))
}

/** Puts rows of texts where their names stand already, and the others into new rows. Empty texts leave what stands there. */
export function placeByName(rows: readonly CellTexts[], keyOfName: ReadonlyMap<string, string>, more: (count: number) => string[]): CellText[] {
  const known = rows.map(cells => keyOfName.get(nameKey(cells.name ?? '')))
  const made = more(known.filter(key => key === undefined).length)
  return rows.flatMap((cells, index) => cellsAt(known[index] ?? made.shift() ?? '', cells).filter(cell => cell.text !== ''))
}

/** Names are compared without regard to their case. */
export const nameKey = (name: string) => name.trim().toLowerCase()

function cellsAt(key: string, cells: CellTexts): CellText[] {
  return sampleFields.flatMap((field) => {
    const text = cells[field]
    return text === undefined ? [] : [{ key, field, text }]
  })
}
