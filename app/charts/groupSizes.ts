import type { EChartsOption } from 'echarts'
import { counted } from '#shared/science/numeric/numberWords'
import type { Palette } from '#shared/tokens'
import { chartText, plainAxis } from '~/charts/axis'
import { formatCount, formatShare } from '~/utils/formatMeasures'

/** Bars: how many aligned features were found in 1, 2, 3 … tables. */
export function groupSizesOption(groupSizes: readonly number[], palette: Palette): EChartsOption {
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    grid: { left: 68, right: 12, top: 16, bottom: 44 },
    xAxis: { ...plainAxis(palette, 'found in this many tables', 26), type: 'category', data: groupSizes.map((_, i) => String(i + 1)), splitLine: { show: false } },
    yAxis: { ...plainAxis(palette, 'aligned features', 52), type: 'value', minInterval: 1, axisLabel: { ...chartText(palette), formatter: formatCount } },
    tooltip: { trigger: 'axis', confine: true, transitionDuration: 0, backgroundColor: palette.panel, borderColor: palette.muted, textStyle: { ...chartText(palette), color: palette.ink } },
    series: [{ id: 'groups', name: 'aligned features', type: 'bar', data: [...groupSizes], itemStyle: { color: palette.muted }, barMaxWidth: 40 }],
  }
}

/** The same in words. */
export function groupSizesText(groupSizes: readonly number[]): string {
  const groups = groupSizes.reduce((sum, count) => sum + count, 0)
  if (groups === 0) return 'No aligned features.'
  const tables = groupSizes.length
  const single = groupSizes[0] ?? 0
  const all = groupSizes[tables - 1] ?? 0
  const more = groupSizes.slice(Math.floor(tables / 2)).reduce((sum, count) => sum + count, 0)
  const parts = [`${counted(single, 'aligned feature')} (${formatShare(single, groups)}) stood in one table alone`]
  if (tables > 1) parts.push(`${formatCount(more)} (${formatShare(more, groups)}) in more than half of the ${tables} tables`, `${formatCount(all)} (${formatShare(all, groups)}) in all of them`)
  return `${parts.join(', ')}.`
}
