import { type BuiltColumns, ColumnBuilder } from '../../science/table/buildColumns'
import type { TableLayout } from '../../science/table/layout'
import { decodeText } from './encoding'
import { readRows } from './readRows'

/**
 * Reads a table by a decided layout, chunk by chunk, into growing columns; memory holds the columns and one chunk of text.
 * `expectedRows` is what the survey counted; `onRows` hears how many rows were looked at so far. Throws TableRefused where nothing can be used.
 */
export async function readTable(chunks: AsyncIterable<Uint8Array>, layout: TableLayout, expectedRows = 0, onRows?: (rows: number) => void): Promise<BuiltColumns> {
  const builder = new ColumnBuilder(layout, expectedRows)
  const lastHeadLine = layout.unitsLine ?? layout.headerLine ?? 0
  let seen = 0
  for await (const batch of readRows(decodeText(chunks, layout.encoding), layout.delimiter)) {
    for (let index = 0; index < batch.rows.length; index++) {
      const line = batch.lines[index] ?? 0
      if (line > lastHeadLine) builder.add(batch.rows[index] ?? [], line)
    }
    seen += batch.rows.length
    onRows?.(seen)
  }
  return builder.finish()
}
