import { emptySurvey, surveyCell } from '../../science/table/columnSurvey'
import { MAX_TABLE_ROWS, type TextEncoding } from '../../science/table/layout'
import { skippedKind } from '../../science/table/skippedLines'
import { TableRefused } from '../../science/table/tableRefused'
import type { TableSurvey } from '../../science/table/tableSurvey'
import { wholeNumber } from '../../science/numeric/numberWords'
import { decodeText, markedEncoding, whyNoText, WrongEncoding } from './encoding'
import { stripFormulaGuard } from './formulaGuard'
import { readRows } from './readRows'
import { sketchTable, type TableSketch } from './sketchTable'

/** Opens the file anew from its first byte. */
export type OpenFile = () => AsyncIterable<Uint8Array>

const HEAD_CHARACTERS = 262_144
const PREVIEW_ROWS = 12
const MAX_COLUMNS = 2_000

/**
 * Looks through a whole file, chunk by chunk, and finds all that a layout is proposed from (proposeLayout): encoding, delimiter, header, units row and,
 * column by column, how its numbers are written. The whole file is looked at because its last row may be the one that tells. Throws TableRefused where it is no table.
 */
export async function surveyTable(open: OpenFile): Promise<TableSurvey> {
  const head = await firstBytes(open, 65_536)
  if (head.length === 0) throw new TableRefused('The file is empty.')
  const whyNot = whyNoText(head)
  if (whyNot !== null) throw new TableRefused(whyNot)
  const encoding = markedEncoding(head) ?? 'utf-8'
  try {
    return await surveyAs(open, encoding)
  }
  catch (error) {
    if (error instanceof WrongEncoding && markedEncoding(head) === null) return await surveyAs(open, 'windows-1252')
    if (error instanceof WrongEncoding) throw new TableRefused('The file begins as UTF-8 and goes on as something else. Export it again.')
    throw error
  }
}

async function surveyAs(open: OpenFile, encoding: TextEncoding): Promise<TableSurvey> {
  const text = await firstText(open, encoding)
  if (text.trim() === '') throw new TableRefused('The file is empty.')
  const sketch = sketchTable(text)
  if (sketch === null) throw new TableRefused('This is not a table of features: no columns of numbers were found in it.')
  if (sketch.header.length > MAX_COLUMNS) throw new TableRefused(`The file has more than ${wholeNumber(MAX_COLUMNS)} columns, the most that are read.`)
  return surveyRows(open, encoding, sketch)
}

async function surveyRows(open: OpenFile, encoding: TextEncoding, sketch: TableSketch): Promise<TableSurvey> {
  const survey: TableSurvey = { ...sketch, header: sketch.header.map(stripFormulaGuard), encoding, columns: sketch.header.map(emptySurvey), rows: 0, preview: [] }
  const { columns } = survey
  const lastHeadLine = sketch.unitsLine ?? sketch.headerLine ?? 0
  for await (const batch of readRows(decodeText(open(), encoding), sketch.delimiter)) {
    batch.rows.forEach((row, index) => {
      const line = batch.lines[index] ?? 0
      if (line <= lastHeadLine || skippedKind(row) !== null) return
      survey.rows++
      for (let column = 0; column < columns.length; column++) {
        const of = columns[column]
        if (of) surveyCell(of, row[column] ?? '')
      }
      if (survey.preview.length < PREVIEW_ROWS) survey.preview.push({ line, cells: row.map(cell => stripFormulaGuard(cell).slice(0, 200)) })
    })
    if (survey.rows > MAX_TABLE_ROWS) throw new TableRefused(`The file has more than ${wholeNumber(MAX_TABLE_ROWS)} rows, the most that is read.`)
  }
  return survey
}

async function firstBytes(open: OpenFile, wanted: number): Promise<Uint8Array> {
  const parts: number[] = []
  for await (const chunk of open()) {
    for (const byte of chunk.subarray(0, wanted - parts.length)) parts.push(byte)
    if (parts.length >= wanted) break
  }
  return Uint8Array.from(parts)
}

async function firstText(open: OpenFile, encoding: TextEncoding): Promise<string> {
  let text = ''
  for await (const part of decodeText(open(), encoding)) {
    text += part
    if (text.length >= HEAD_CHARACTERS) break
  }
  if (text.length < HEAD_CHARACTERS) return text
  const cut = text.slice(0, HEAD_CHARACTERS)
  return cut.slice(0, Math.max(cut.lastIndexOf('\n'), 0)) || cut
}
