import type { XAXisComponentOption } from 'echarts'
import { fonts, type Palette } from '#shared/tokens'

/** Text of a chart. */
export const chartText = (palette: Palette) => ({ fontFamily: fonts.text, color: palette.muted, fontSize: 12 })

/** How a plain axis looks: hairlines, its name in the middle. */
export function plainAxis(palette: Palette, name: string, gap: number) {
  return {
    name,
    nameLocation: 'middle' as const,
    nameGap: gap,
    nameTextStyle: chartText(palette),
    axisLabel: chartText(palette),
    axisLine: { lineStyle: { color: palette.muted } },
    axisTick: { lineStyle: { color: palette.muted } },
    splitLine: { lineStyle: { color: palette.hairline } },
  }
}

/** An axis of minutes. */
export const minutesAxis = (palette: Palette): XAXisComponentOption => ({ ...plainAxis(palette, 'retention time, minutes', 26), type: 'value', min: 'dataMin', max: 'dataMax', axisLabel: { ...chartText(palette), showMinLabel: true, formatter: (value: number) => Number(value.toFixed(1)).toString() } })
