import type { ScatterSeriesOption } from 'echarts/charts'
import type { Palette } from '#shared/tokens'
import { COUNTED_VERDICTS, VERDICT, type Verdict } from '#shared/science/verdict/verdicts'
import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { verdictLooks } from '~/charts/verdictLook'

/** One drawn series and the features behind its points. */
export interface FoldSeries { option: ScatterSeriesOption, features: Int32Array }

/** Later ones lie on top: what differs above what is level. */
const DRAWN: readonly Verdict[] = ['setAside', 'unsettled', 'level', 'moreA', 'moreB', 'onlyA', 'onlyB']
const GRIDS = [PLACE.ratios, PLACE.laneA, PLACE.laneB] as const

/** One series a verdict and grid, of the features among `rows`; a cross is two thin bars, since large series know only simple shapes. */
export function foldSeries(points: FoldPoints, verdict: Uint8Array, rows: Int32Array, palette: Palette): FoldSeries[] {
  const series: FoldSeries[] = []
  for (const name of DRAWN) {
    GRIDS.forEach((place, grid) => {
      const features = rows.filter(i => verdict[i] === VERDICT[name] && points.place[i] === place)
      if (features.length === 0) return
      const data = new Float64Array(features.length * 2)
      features.forEach((feature, at) => {
        data[2 * at] = points.x[feature]!
        data[2 * at + 1] = points.y[feature]!
      })
      marks(name, palette).forEach((mark, part) => series.push({
        features,
        option: { ...mark, type: 'scatter', id: `${name}-${grid}-${part}`, name, xAxisIndex: grid, yAxisIndex: grid, data, dimensions: ['x', 'y'], large: true, largeThreshold: 0, progressive: 0, animation: false, emphasis: { disabled: true } },
      }))
    })
  }
  return series
}

function marks(name: Verdict, palette: Palette): Pick<ScatterSeriesOption, 'symbol' | 'symbolSize' | 'itemStyle'>[] {
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

/** Flagged features once more, ringed; few, so they are drawn one by one. */
export function flaggedSeries(points: FoldPoints, verdict: Uint8Array, flagged: readonly number[], palette: Palette): FoldSeries[] {
  return GRIDS.flatMap((place, grid): FoldSeries[] => {
    const features = Int32Array.from(flagged.filter(i => points.place[i] === place && isCounted(verdict[i])))
    if (features.length === 0) return []
    return [{
      features,
      option: {
        type: 'scatter', id: `flagged-${grid}`, name: 'flagged', xAxisIndex: grid, yAxisIndex: grid, z: 5, animation: false,
        symbol: 'diamond', symbolSize: 14, itemStyle: { color: 'transparent', borderColor: palette.ink, borderWidth: 1.5 },
        data: [...features].map(i => [points.x[i]!, points.y[i]!]),
      },
    }]
  })
}

function isCounted(code: number | undefined): boolean {
  return COUNTED_VERDICTS.some(name => VERDICT[name] === code)
}
