import type { ColumnSurvey } from './columnSurvey'
import type { TextEncoding } from './layout'

/** All that one look through a file has found: enough to propose a layout, and to propose it again after a person's answer, without the file. */
export interface TableSurvey {
  encoding: TextEncoding
  delimiter: string
  /** Lines are counted from 1. Without a header the columns are called "Column 1", "Column 2" … */
  headerLine: number | null
  unitsLine: number | null
  header: string[]
  units: string[] | null
  columns: ColumnSurvey[]
  /** Rows under the header that are not blank, comment or total lines. */
  rows: number
  /** The first of these rows with their lines. */
  preview: { line: number, cells: string[] }[]
}
