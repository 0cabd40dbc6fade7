import { guardFormula } from '#shared/formats/delimitedText/formulaGuard'
import { writeCsv, type CsvCell } from '#shared/formats/delimitedText/writeCsv'
import { writeTabbed } from '#shared/formats/sampleSheet/writeSheet'
import type { FeatureColumn } from '~/utils/featureColumns'

/** Rows of the feature table for a spreadsheet's clipboard: head and full numbers, text that would run as a formula guarded. */
export function tabbedRows(columns: readonly FeatureColumn[], features: Iterable<number>): string {
  return writeTabbed([columns.map(({ title }) => guardFormula(title)), ...Array.from(features, feature => columns.map(({ exact }) => tabbedCell(exact(feature))))])
}

function tabbedCell(value: CsvCell): string {
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : ''
  return guardFormula(String(value ?? ''))
}

/** Rows of the feature table as CSV below notes. */
export function csvRows(columns: readonly FeatureColumn[], features: Iterable<number>, notes: readonly string[]): string {
  function* cells() {
    for (const feature of features) yield columns.map(({ exact }) => exact(feature))
  }
  return writeCsv(columns.map(({ title }) => title), cells(), notes)
}
