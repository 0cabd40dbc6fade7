import Papa from 'papaparse'
import { emptySurvey, surveyCell } from '../../science/table/columnSurvey'
import { readHeaderCell, readUnit } from '../../science/table/headerCell'
import { skippedKind } from '../../science/table/skippedLines'

/** What the first rows of a file show: how cells are parted, and where the header and the units stand. Lines are counted from 1. */
export interface TableSketch { delimiter: string, headerLine: number | null, unitsLine: number | null, header: string[], units: string[] | null }

const DELIMITERS = ['\t', ';', ',', '|']
const HEAD_ROWS = 200
const TITLE_LINES = 60

/**
 * Finds delimiter, header and units row in the first part of a file (line breaks as "\n"). null where no delimiter makes columns of numbers
 * under one header: that is no table. Of two delimiters that both do, the one under which the header says more holds.
 */
export function sketchTable(head: string): TableSketch | null {
  const hint = /^sep=([\t;,|])\n/.exec(head)?.[1]
  let best: { sketch: TableSketch, worth: number } | null = null
  for (const delimiter of hint ? [hint] : DELIMITERS) {
    const found = sketchWith(head, delimiter)
    if (found !== null && (best === null || found.worth > best.worth)) best = found
  }
  return best?.sketch ?? null
}

function sketchWith(head: string, delimiter: string): { sketch: TableSketch, worth: number } | null {
  const rows = Papa.parse<string[]>(head, { delimiter, newline: '\n', preview: HEAD_ROWS }).data
  const lines: number[] = []
  let line = 1
  for (const row of rows) {
    lines.push(line)
    line += 1 + row.reduce((count, cell) => count + cell.split('\n').length - 1, 0)
  }
  const place = findHeader(rows)
  if (place === null) return null
  const { at, says } = place
  const below = rows.slice(at + 1)
  const headerRow = rows[at === -1 ? rows.findIndex(isNumeric) : at] ?? []
  // A last column without a name counts where rows have something in it; a delimiter too many at the end of each line makes no column.
  const filled = Math.max(0, ...below.map(row => trimEnd(row).length))
  const header = headerRow.slice(0, Math.max(trimEnd(headerRow).length, Math.min(headerRow.length, filled)))
  const firstBelow = below.findIndex(row => row.some(cell => cell.trim() !== ''))
  const unitsRow = at >= 0 && firstBelow >= 0 && isUnitsRow(below[firstBelow] ?? []) ? firstBelow : -1
  const body = below.slice(unitsRow + 1).filter(row => skippedKind(row) === null)
  if (header.length < 2) return null
  const fits = body.filter(row => trimEnd(row).length <= header.length && row.length >= 2)
  const numeric = fits.filter(isNumeric).length
  if (body.length > 0 && (fits.length < body.length / 2 || numeric < body.length / 4)) return null
  if (body.length === 0 && says === 0) return null
  return {
    worth: 3 * says + (body.length > 0 ? fits.length / body.length + numeric / body.length : 0),
    sketch: {
      delimiter, header: at === -1 ? header.map((_, index) => `Column ${index + 1}`) : header,
      headerLine: at === -1 ? null : lines[at] ?? 1,
      unitsLine: unitsRow < 0 ? null : lines[at + 1 + unitsRow] ?? null,
      units: unitsRow < 0 ? null : below[unitsRow] ?? null,
    },
  }
}

/** The row whose cells say most by words of the trade; else the last row of words before the numbers; -1 where numbers begin at once; null where there is nothing. */
function findHeader(rows: readonly string[][]): { at: number, says: number } | null {
  let at = -1
  let says = 0
  rows.slice(0, TITLE_LINES).forEach((row, index) => {
    const said = whatHeaderSays(row)
    if (said > says) [at, says] = [index, said]
  })
  if (says > 0) return { at, says }
  const firstNumbers = rows.findIndex(isNumeric)
  if (firstNumbers < 0) return null
  const before = rows.slice(0, firstNumbers).findLastIndex(row => skippedKind(row) === null)
  const width = rows[firstNumbers]?.length ?? 0
  const isHeader = before >= 0 && (rows[before]?.length ?? 0) === width
  return { at: isHeader ? before : -1, says: 0 }
}

function whatHeaderSays(row: readonly string[]): number {
  if (row.length < 2 || row.filter(looksLikeNumber).length > row.length / 2) return 0
  const roles = new Set<string>()
  for (const cell of row.slice(0, 5000)) {
    if (cell.length > 120) continue
    const { role } = readHeaderCell(cell)
    if (role === 'mz' || role === 'minutes' || role === 'intensity') roles.add(role)
  }
  return roles.size
}

function isUnitsRow(row: readonly string[]): boolean {
  const cells = row.filter(cell => cell.trim() !== '')
  const units = cells.filter(cell => readUnit(cell).isUnit).length
  return units > 0 && units >= cells.length / 2
}

function looksLikeNumber(cell: string): boolean {
  const survey = emptySurvey()
  surveyCell(survey, cell)
  return survey.numbers > 0
}

const isNumeric = (row: readonly string[]) => row.filter(looksLikeNumber).length >= 2

function trimEnd(row: readonly string[]): string[] {
  let length = row.length
  while (length > 0 && (row[length - 1] ?? '').trim() === '') length--
  return row.slice(0, length)
}
