import type { ScatterSeriesOption } from 'echarts/charts'
import type { Verdict } from '#shared/science/verdict/verdicts'
import type { Palette } from '#shared/tokens'
import { verdictLooks } from '~/charts/verdictLook'

/** How a verdict is marked on a plot of many points; a cross is two thin bars, since large series know only simple shapes. */
export function verdictMarks(name: Verdict, palette: Palette): Pick<ScatterSeriesOption, 'symbol' | 'symbolSize' | 'itemStyle'>[] {
  const { shape, colour } = verdictLooks[name]
  const color = palette[colour]
  switch (shape) {
    case 'circle': return [{ symbol: 'circle', symbolSize: 6, itemStyle: { color, opacity: 0.85 } }]
    case 'square': return [{ symbol: 'rect', symbolSize: 5, itemStyle: { color, opacity: 0.85 } }]
    case 'dash': return [{ symbol: 'rect', symbolSize: [7, 2], itemStyle: { color, opacity: 0.75 } }]
    case 'ring': return [{ symbol: 'circle', symbolSize: 5, itemStyle: { color: 'transparent', borderColor: color, borderWidth: 1.2, opacity: 0.75 } }]
    case 'cross': return ([[1.2, 5], [5, 1.2]] as const).map(([width, height]) => ({ symbol: 'rect', symbolSize: [width, height], itemStyle: { color, opacity: 0.75 } }))
  }
}
