import Papa from 'papaparse'
import type { SampleField } from '../../schemas/sample'
import { stripFormulaGuard } from '../delimitedText/formulaGuard'
import { parseNumber } from '../typedNumber'
import { sheetColumns } from './columns'
import { mapHeader, type MappedColumn } from './mapHeader'
import { splitAmount } from './readCell'

export type CellTexts = Partial<Record<SampleField, string>>

export interface SheetBlock {
  /** The cells of each row, as texts; `line` is where the row began in what was read, from 1. */
  rows: { line: number, cells: CellTexts }[]
  /** Whether the first row named the columns. */
  headed: boolean
  /** Heads that were not understood. */
  unknown: string[]
  /** Columns beyond the last of the sheet that were left out. */
  beyond: number
}

/**
 * Reads a block pasted from a spreadsheet (tab-separated). Where its first row names columns, they are taken by their words;
 * else they follow each other from `start` on. Empty rows within a headed block are left out.
 */
export function readPasted(text: string, start: SampleField): SheetBlock {
  const rows = readLines(text, '\t')
  const header = mapHeader(rows[0]?.cells ?? [])
  if (header) return headedBlock(rows.slice(1), header.columns, header.unknown)
  const from = sheetColumns.findIndex(column => column.field === start)
  const width = rows.reduce((widest, row) => Math.max(widest, row.cells.length), 0)
  const columns = sheetColumns.slice(from, from + width).map(({ field }): MappedColumn => ({ field, factor: 1, unit: null }))
  return { rows: rows.map(row => ({ line: row.line, cells: cellsOf(row.cells, columns) })), headed: false, unknown: [], beyond: width - columns.length }
}

/** Reads a CSV file of samples; its delimiter is found out. Null where its first row does not name columns of the sheet. */
export function readSheetCsv(text: string): SheetBlock | null {
  const rows = readLines(text.replace(/^\uFEFF/, ''), '').filter(row => row.cells.some(cell => cell.trim() !== ''))
  const header = mapHeader(rows[0]?.cells ?? [])
  if (!header?.columns.some(column => column?.field === 'name')) return null
  return headedBlock(rows.slice(1), header.columns, header.unknown)
}

interface Line { line: number, cells: string[] }

function readLines(text: string, delimiter: string): Line[] {
  const { data } = Papa.parse<string[]>(text.replace(/\r?\n$/, ''), { delimiter, delimitersToGuess: [',', ';', '\t'] })
  let line = 1
  return data.map((cells) => {
    const row = { line, cells: cells.map(stripFormulaGuard) }
    line += 1 + cells.reduce((breaks, cell) => breaks + (cell.match(/\r\n|\r|\n/g)?.length ?? 0), 0)
    return row
  })
}

function headedBlock(rows: readonly Line[], columns: readonly (MappedColumn | null)[], unknown: string[]): SheetBlock {
  const filled = rows.filter(row => row.cells.some(cell => cell.trim() !== ''))
  return { rows: filled.map(({ line, cells }) => ({ line, cells: cellsOf(cells, columns) })), headed: true, unknown, beyond: 0 }
}

function cellsOf(cells: readonly string[], columns: readonly (MappedColumn | null)[]): CellTexts {
  const texts: CellTexts = {}
  columns.forEach((column, index) => {
    const text = cells[index]
    if (!column || text === undefined) return
    texts[column.field] = scaled(text.replaceAll(/\s*[\r\n]+\s*/g, ' ').trim(), column.factor)
  })
  const unit = columns.find(column => column?.field === 'amount')?.unit
  if (unit && texts.amount && texts.amountUnit === undefined) texts.amountUnit = unit
  return withSplitAmount(texts)
}

/** An amount that names its unit fills both cells. */
export function withSplitAmount(cells: CellTexts): CellTexts {
  const split = cells.amount === undefined ? null : splitAmount(cells.amount)
  return split ? { ...cells, amount: split.amount, amountUnit: split.unit } : cells
}

/** Twelve digits: a factor of ten must not turn 0.3 into 0.30000000000000004. */
function scaled(text: string, factor: number): string {
  if (factor === 1) return text
  const value = parseNumber(text)
  return typeof value === 'number' ? String(Number((value * factor).toPrecision(12))) : text
}
