import type { ScatterSeriesOption } from 'echarts/charts'
import type { Verdict } from '#shared/science/verdict/verdicts'
import type { Palette } from '#shared/tokens'
import { verdictLooks } from '~/charts/verdictLook'

/** So many marks and more are drawn smaller, or they hide each other; below 4 px the drawing library fills squares, whatever the shape. */
const CROWDED = 8000

/** How a verdict is marked on a plot of so many points; a cross is two thin bars, since large series know only simple shapes. */
export function verdictMarks(name: Verdict, palette: Palette, points: number): Pick<ScatterSeriesOption, 'symbol' | 'symbolSize' | 'itemStyle'>[] {
  const { shape, colour } = verdictLooks[name]
  const color = palette[colour]
  const smaller = points >= CROWDED ? 0.75 : 1
  switch (shape) {
    case 'circle': return [{ symbol: 'circle', symbolSize: 6 * smaller, itemStyle: { color, opacity: 0.85 } }]
    case 'square': return [{ symbol: 'rect', symbolSize: 5 * smaller, itemStyle: { color, opacity: 0.85 } }]
    case 'dash': return [{ symbol: 'rect', symbolSize: [7 * smaller, 2], itemStyle: { color, opacity: 0.75 } }]
    case 'ring': return [{ symbol: 'circle', symbolSize: Math.max(4, 5 * smaller), itemStyle: { color: 'transparent', borderColor: color, borderWidth: 1.2, opacity: 0.75 } }]
    case 'cross': return ([[1.2, 5], [5, 1.2]] as const).map(([width, height]) => ({ symbol: 'rect', symbolSize: [width, height], itemStyle: { color, opacity: 0.75 } }))
  }
}
