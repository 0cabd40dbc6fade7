import type { AmountUnit, SampleField } from '../../schemas/sample'
import { parseNumber } from '../typedNumber'
import { plainWords, sheetColumns, type SheetColumn } from './columns'

/** What a column of a pasted block is: its field, and the factor from the unit of its head to ours. */
export interface MappedColumn { field: SampleField, factor: number, unit: AmountUnit | null }

export interface MappedHeader {
  columns: (MappedColumn | null)[]
  /** Heads that say nothing to us; their columns are left out. */
  unknown: string[]
}

/**
 * Reads the first row of a block as heads of columns, by their words and units. Null where it is no header: fewer than two heads
 * are understood, or a number stands in it. Where two heads mean the same, the first counts.
 */
export function mapHeader(cells: readonly string[]): MappedHeader | null {
  if (cells.some(cell => typeof parseNumber(cell) === 'number')) return null
  const taken = new Set<SampleField>()
  const columns = cells.map((cell) => {
    const column = mapHead(cell)
    if (!column || taken.has(column.field)) return null
    taken.add(column.field)
    return column
  })
  if (taken.size < 2) return null
  return { columns, unknown: cells.filter((cell, index) => columns[index] === null && cell.trim() !== '').map(cell => cell.trim()) }
}

function mapHead(cell: string): MappedColumn | null {
  const words = plainWords(cell)
  const exact = sheetColumns.find(column => column.words.includes(words))
  if (exact) return { field: exact.field, factor: 1, unit: null }
  const match = /^(?<head>.+) (?:in )?(?<unit>\S+)$/.exec(words)
  const { head = '', unit = '' } = match?.groups ?? {}
  const column = sheetColumns.find(each => each.words.includes(head.replace(/ in$/, '')) && each.units?.[unit] !== undefined)
  return column ? { field: column.field, factor: column.units?.[unit] ?? 1, unit: amountUnit(column, unit) } : null
}

/** The unit of the amount that a head names. */
function amountUnit(column: SheetColumn, unit: string): AmountUnit | null {
  if (column.field !== 'amount') return null
  return unit.endsWith('l') ? 'mL' : 'mg'
}
