import { guardFormula } from './formulaGuard'

/** What a CSV cell may hold. Numbers are written in full and never guarded; null, undefined and NaN are empty cells. */
export type CsvCell = string | number | boolean | null | undefined

/** One cell as text: quoted where it must be (comma, quote, line break, outer space), guarded against formulas where it is text. */
export function csvCell(value: CsvCell): string {
  if (value === null || value === undefined) return ''
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : ''
  const text = typeof value === 'boolean' ? String(value) : guardFormula(value)
  return /[",\r\n]|^\s|\s$/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
}

/** One line with its line break. */
export function csvLine(cells: readonly CsvCell[]): string {
  return `${cells.map(csvCell).join(',')}\r\n`
}

/** Lines of a CSV one by one, for a response that is streamed. Notes are written first, each as a comment line ("# …"). */
export function* csvLines(header: readonly string[], rows: Iterable<readonly CsvCell[]>, notes: readonly string[] = []): Generator<string> {
  for (const note of notes) yield csvLine([`# ${note.replaceAll(/[\r\n]+/g, ' ')}`])
  yield csvLine(header)
  for (const row of rows) yield csvLine(row)
}

/**
 * A CSV document after RFC 4180 (comma, CRLF, doubled quotes), UTF-8 with a byte order mark so that spreadsheets read it as such.
 * Text cells that would run as formulas are guarded by an apostrophe (OWASP, CSV injection); stripFormulaGuard takes it away.
 */
export function writeCsv(header: readonly string[], rows: Iterable<readonly CsvCell[]>, notes: readonly string[] = []): string {
  return `\uFEFF${[...csvLines(header, rows, notes)].join('')}`
}
