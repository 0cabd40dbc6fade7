import { ColumnBuilder } from '#shared/science/table/buildColumns'
import type { TableLayout } from '#shared/science/table/layout'
import type { TableSurvey } from '#shared/science/table/tableSurvey'

/** The first row of a preview as the layout would read it, as a sentence: what it becomes, or why it can't be used. */
export function readPreview(survey: TableSurvey, layout: TableLayout): string {
  const row = survey.preview[0]
  if (!row) return ''
  const builder = new ColumnBuilder(layout)
  builder.add(row.cells, row.line)
  try {
    const { samples } = builder.finish()
    const sample = samples.find(one => one.features > 0)
    const columns = sample?.take()
    if (!sample || !columns) return `Line ${row.line} is read as a feature that no sample shows.`
    const mass = layout.massKind === 'mz' ? `m/z ${columns.mz[0]}` : `a neutral mass of ${columns.mz[0]}`
    return `Line ${row.line} is read as ${mass} at ${Number(columns.minutes[0]?.toPrecision(7))} min, intensity ${columns.intensity[0]}${sample.name === null ? '' : ` in ${sample.name}`}.`
  }
  catch (error) {
    return error instanceof Error ? error.message : ''
  }
}
