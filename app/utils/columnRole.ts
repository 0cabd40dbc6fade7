import type { TableLayout } from '#shared/science/table/layout'

/** What a column of a file is, by the layout as far as it is known; null for one that is not read. */
export function columnRole(layout: Partial<TableLayout>, column: number): string | null {
  const time = layout.timeUnit ?? 'minutes'
  if (column === layout.mzColumn) return layout.massKind === 'neutral' ? 'neutral mass' : 'm/z'
  if (column === layout.minutesColumn) return `time, ${time}`
  if (column === layout.intensityColumn) return layout.measure === 'unknown' || layout.measure === undefined ? 'intensity' : `intensity, ${layout.measure}`
  if (column === layout.widthColumn) return `width, ${layout.widthUnit ?? time}`
  const sample = layout.sampleColumns?.find(one => one.column === column || one.minutesColumn === column)
  if (!sample) return null
  return sample.column === column ? `sample ${sample.name}` : `time of ${sample.name}`
}
