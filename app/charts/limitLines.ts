import type { ScatterSeriesOption } from 'echarts/charts'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import { threeDigits, times } from '#shared/science/numeric/numberWords'
import { fonts, type Palette } from '#shared/tokens'
import type { FoldPoints } from '~/charts/foldPoints'

/** The limits as lines, each with its value where labels are wished: fold and alpha on the plot of ratios, reach in both lanes. */
export function limitLines(points: FoldPoints, { foldLimit, alpha, reachLimit }: Pick<ComparisonSettings, 'foldLimit' | 'alpha' | 'reachLimit'>, palette: Palette, labels: boolean): ScatterSeriesOption[] {
  const fold = times(2 ** foldLimit)
  const lines: { at: { xAxis?: number, yAxis?: number }, text: string, grid: number }[] = [
    { at: { xAxis: -foldLimit }, text: fold, grid: 0 },
    { at: { xAxis: foldLimit }, text: fold, grid: 0 },
    ...(points.kind === 'certainty' ? [{ at: { yAxis: -Math.log10(alpha) }, text: `q ${threeDigits(alpha)}`, grid: 0 }] : []),
    ...[1, 2].map(grid => ({ at: { yAxis: Math.log10(reachLimit) }, text: times(reachLimit), grid })),
  ]
  return [0, 1, 2].map(grid => ({
    type: 'scatter', id: `limits-${grid}`, xAxisIndex: grid, yAxisIndex: grid, data: [], silent: true,
    markLine: {
      silent: true, symbol: 'none', animation: false,
      lineStyle: { color: palette.muted, type: 'dashed', width: 1 },
      data: lines.filter(line => line.grid === grid).map(({ at, text }) => ({
        ...at, label: { show: labels, formatter: text, color: palette.muted, fontFamily: fonts.text, fontSize: 11, position: grid === 0 && at.yAxis === undefined ? 'end' : 'insideEndTop', distance: at.yAxis === undefined ? 3 : 2 },
      })),
    },
  }))
}
