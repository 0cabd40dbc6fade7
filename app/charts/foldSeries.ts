import type { ScatterSeriesOption } from 'echarts/charts'
import type { Palette } from '#shared/tokens'
import { COUNTED_VERDICTS, VERDICT, type Verdict } from '#shared/science/verdict/verdicts'
import { PLACE, type FoldPoints } from '~/charts/foldPoints'
import { verdictMarks } from '~/charts/verdictMarks'

/** One drawn series and the features behind its points. */
export interface FoldSeries { option: ScatterSeriesOption, features: Int32Array }

/** Later ones lie on top: what differs above what is level. */
const DRAWN: readonly Verdict[] = ['setAside', 'unsettled', 'level', 'moreA', 'moreB', 'onlyA', 'onlyB']
const GRIDS = [PLACE.ratios, PLACE.laneA, PLACE.laneB] as const

/** One series a verdict and grid, of the features among `rows`. */
export function foldSeries(points: FoldPoints, verdict: Uint8Array, rows: Int32Array, palette: Palette): FoldSeries[] {
  const series: FoldSeries[] = []
  const groups = groupRows(points, verdict, rows)
  for (const name of DRAWN) {
    GRIDS.forEach((place, grid) => {
      const features = groups.get(groupOf(VERDICT[name], place))
      if (!features) return
      const data = new Float64Array(features.length * 2)
      features.forEach((feature, at) => {
        data[2 * at] = points.x[feature]!
        data[2 * at + 1] = points.y[feature]!
      })
      verdictMarks(name, palette, rows.length).forEach((mark, part) => series.push({
        features,
        option: { ...mark, type: 'scatter', id: `${name}-${grid}-${part}`, name, xAxisIndex: grid, yAxisIndex: grid, data, dimensions: ['x', 'y'], large: true, largeThreshold: 0, progressive: 0, animation: false, silent: true, emphasis: { disabled: true } },
      }))
    })
  }
  return series
}

const groupOf = (verdict: number, place: number) => 4 * verdict + place

/** The rows by verdict and place, counted first, so that each group is one array. */
function groupRows({ place }: FoldPoints, verdict: Uint8Array, rows: Int32Array): Map<number, Int32Array> {
  const counts = new Map<number, number>()
  for (const i of rows) {
    const group = groupOf(verdict[i]!, place[i]!)
    counts.set(group, (counts.get(group) ?? 0) + 1)
  }
  const groups = new Map([...counts].map(([group, count]) => [group, new Int32Array(count)]))
  const filled = new Map<number, number>()
  for (const i of rows) {
    const group = groupOf(verdict[i]!, place[i]!)
    const at = filled.get(group) ?? 0
    const features = groups.get(group)
    if (features) features[at] = i
    filled.set(group, at + 1)
  }
  return groups
}

/** Flagged features once more, ringed; few, so they are drawn one by one. */
export function flaggedSeries(points: FoldPoints, verdict: Uint8Array, flagged: readonly number[], palette: Palette): FoldSeries[] {
  return GRIDS.flatMap((place, grid): FoldSeries[] => {
    const features = Int32Array.from(flagged.filter(i => points.place[i] === place && isCounted(verdict[i])))
    if (features.length === 0) return []
    return [{
      features,
      option: {
        type: 'scatter', id: `flagged-${grid}`, name: 'flagged', xAxisIndex: grid, yAxisIndex: grid, z: 5, animation: false, silent: true,
        symbol: 'diamond', symbolSize: 14, itemStyle: { color: 'transparent', borderColor: palette.ink, borderWidth: 1.5 },
        data: [...features].map(i => [points.x[i]!, points.y[i]!]),
      },
    }]
  })
}

function isCounted(code: number | undefined): boolean {
  return COUNTED_VERDICTS.some(name => VERDICT[name] === code)
}
