import Papa from 'papaparse'
import { TableRefused } from '../../science/table/tableRefused'
import { wholeNumber } from '../../science/numeric/numberWords'

/** Longer than any line of a feature table: a quotation mark that is never closed, or no table. */
const MAX_LINE_CHARACTERS = 1_000_000

/** Rows of cells with the line (counted from 1) that each begins on. */
export interface RowBatch { rows: string[][], lines: number[] }

/** Text to rows, batch by batch, by RFC 4180 as far as the file follows it. A quoted cell may hold line breaks: line numbers stay those of the file. */
export async function* readRows(texts: AsyncIterable<string>, delimiter: string): AsyncGenerator<RowBatch> {
  const parser = new Papa.Parser({ delimiter, newline: '\n', quoteChar: '"' })
  let rest = ''
  let line = 1
  const parse = (text: string, last: boolean): RowBatch => {
    const parsed = parser.parse(text, 0, !last) as { data: string[][], errors: { code: string }[], meta: { cursor: number } }
    if (last && text.includes('\n') && parsed.errors.some(error => error.code === 'MissingQuotes')) {
      throw new TableRefused(`A quotation mark that opens on line ${line} is never closed. Correct that line and upload the file again.`)
    }
    rest = last ? '' : text.slice(parsed.meta.cursor)
    const quoted = text.includes('"')
    const lines = parsed.data.map((row) => {
      const start = line
      line += 1 + (quoted ? lineBreaksIn(row) : 0)
      return start
    })
    return { rows: parsed.data, lines }
  }
  for await (const text of texts) {
    if (text.includes('\0')) throw new TableRefused(`This is not a text table: after line ${line} it holds bytes that no text has.`)
    const batch = parse(rest + text, false)
    if (rest.length > MAX_LINE_CHARACTERS) throw new TableRefused(`Line ${line} is longer than ${wholeNumber(MAX_LINE_CHARACTERS)} characters: a quotation mark that is never closed, or no table.`)
    if (batch.rows.length > 0) yield batch
  }
  if (rest !== '') yield parse(rest, true)
}

function lineBreaksIn(row: readonly string[]): number {
  let count = 0
  for (const cell of row) {
    for (let at = cell.indexOf('\n'); at >= 0; at = cell.indexOf('\n', at + 1)) count++
  }
  return count
}
