import type { EChartsOption } from 'echarts'
import type { AlignedTable } from '#shared/types/alignment'
import { counted, signed } from '#shared/science/numeric/numberWords'
import type { Palette } from '#shared/tokens'
import { chartText, minutesAxis, plainAxis } from '~/charts/axis'

export type DriftTable = Pick<AlignedTable, 'sampleName' | 'drift'>

/** Lines: what was subtracted from each table's times. The chosen table stands out by colour and width. */
export function driftOption(tables: readonly DriftTable[], chosen: number, palette: Palette): EChartsOption {
  const text = chartText(palette)
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: text,
    grid: { left: 68, right: 16, top: 16, bottom: 44 },
    xAxis: minutesAxis(palette),
    yAxis: { ...plainAxis(palette, 'shift taken out, minutes', 50), type: 'value', axisLabel: { ...text, formatter: (value: number) => signed(value, 2) } },
    tooltip: { trigger: 'item', confine: true, transitionDuration: 0, backgroundColor: palette.panel, borderColor: palette.muted, textStyle: { ...text, color: palette.ink }, formatter: '{a}' },
    series: tables.map((table, position) => ({
      id: `table-${position}`,
      name: table.sampleName,
      type: 'line' as const,
      data: table.drift,
      showSymbol: false,
      z: position === chosen ? 3 : 2,
      lineStyle: position === chosen ? { color: palette.focus, width: 3 } : { color: palette.muted, width: 1, opacity: 0.55 },
      itemStyle: { color: position === chosen ? palette.focus : palette.muted },
    })),
  }
}

/** The greatest shift of a table, signed, and where; null without a curve. */
export function greatestShift({ drift }: Pick<DriftTable, 'drift'>): { minutes: number, shift: number } | null {
  let greatest: { minutes: number, shift: number } | null = null
  for (const [minutes, shift] of drift) if (!greatest || Math.abs(shift) > Math.abs(greatest.shift)) greatest = { minutes, shift }
  return greatest
}

/** The table that drifts most; 0 where none has a curve. */
export function mostDrifting(tables: readonly DriftTable[]): number {
  const size = (position: number) => Math.abs(greatestShift(tables[position] ?? { drift: [] })?.shift ?? 0)
  return tables.reduce((most, _, position) => size(position) > size(most) ? position : most, 0)
}

/** The same in words. */
export function driftText(tables: readonly DriftTable[], chosen: number): string {
  const curved = tables.filter(table => table.drift.length > 0)
  if (curved.length === 0) return 'No table\'s times were corrected.'
  const most = tables[mostDrifting(tables)]
  const shift = most && greatestShift(most)
  const sentences = [`The times of ${curved.length} of ${counted(tables.length, 'table')} were corrected.`]
  if (most && shift) sentences.push(`${most.sampleName} drifts most: ${signed(shift.shift, 3)} min at ${shift.minutes.toFixed(1)} min.`)
  const own = tables[chosen]
  if (own && own !== most) {
    const ownShift = greatestShift(own)
    sentences.push(ownShift ? `${own.sampleName}: at most ${signed(ownShift.shift, 3)} min, at ${ownShift.minutes.toFixed(1)} min.` : `${own.sampleName} was not corrected.`)
  }
  return sentences.join(' ')
}
