import type { EChartsOption } from 'echarts'
import type { AlignedTable } from '#shared/types/alignment'
import { counted, signed } from '#shared/science/numeric/numberWords'
import type { Palette } from '#shared/tokens'
import { chartText, plainAxis } from '~/charts/axis'
import { formatPpm } from '~/utils/formatMeasures'

export type MassTable = Pick<AlignedTable, 'sampleName' | 'offsetPpm' | 'offsetApplied' | 'residualMedianPpm'>

/** Two marks a table: its offset to the reference (hollow where it was left), and the median distance to the groups' centres. */
export function massErrorOption(tables: readonly MassTable[], palette: Palette): EChartsOption {
  const text = chartText(palette)
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: text,
    legend: { top: 0, left: 60, textStyle: text, itemWidth: 10, itemHeight: 10, selectedMode: false, data: ['offset to the reference', 'error afterwards'] },
    grid: { left: 68, right: 16, top: 32, bottom: 44 },
    xAxis: { ...plainAxis(palette, 'table, in the order of the sample sheet', 26), type: 'category', data: tables.map((_, position) => String(position + 1)), splitLine: { show: false } },
    yAxis: { ...plainAxis(palette, 'ppm', 40), type: 'value', axisLabel: { ...text, formatter: (value: number) => signed(value, 1) } },
    tooltip: { trigger: 'axis', confine: true, transitionDuration: 0, backgroundColor: palette.panel, borderColor: palette.muted, textStyle: { ...text, color: palette.ink } },
    series: [
      {
        id: 'offset', name: 'offset to the reference', type: 'scatter', symbol: 'diamond', symbolSize: 11, itemStyle: { color: palette.focus },
        data: tables.map(table => ({ value: Number(table.offsetPpm.toFixed(2)), itemStyle: table.offsetApplied ? { color: palette.focus } : { color: 'transparent', borderColor: palette.focus, borderWidth: 1.5 } })),
      },
      {
        id: 'residual', name: 'error afterwards', type: 'scatter', symbol: 'rect', symbolSize: [12, 4], itemStyle: { color: palette.muted },
        data: tables.map(table => table.residualMedianPpm === null ? '-' : Number(table.residualMedianPpm.toFixed(2))),
      },
    ],
  }
}

/** The same in words. */
export function massErrorText(tables: readonly MassTable[]): string {
  if (tables.length === 0) return 'No tables.'
  const taken = tables.filter(table => table.offsetApplied)
  const residuals = tables.map(table => table.residualMedianPpm).filter(value => value !== null)
  const sentences = [taken.length === 0
    ? 'No mass offset was taken out.'
    : `A mass offset was taken out of ${counted(taken.length, 'table')}: ${taken.slice(0, 4).map(table => `${table.sampleName} ${signed(table.offsetPpm, 1)} ppm`).join(', ')}${taken.length > 4 ? ' and others' : ''}.`]
  if (residuals.length > 0) sentences.push(`Afterwards half of the shared features lie within ${formatPpm(Math.min(...residuals))} to ${formatPpm(Math.max(...residuals))} ppm of their group's centre, by table.`)
  return sentences.join(' ')
}
