import type { EChartsOption, LineSeriesOption, ScatterSeriesOption } from 'echarts'
import { ellipsePoints, groupEllipse, type GroupEllipse } from '#shared/science/components/groupEllipse'
import type { SampleComponents } from '#shared/science/components/sampleComponents'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { Palette } from '#shared/tokens'
import { groupLook } from '~/charts/groupLook'
import { chartText } from '~/charts/axis'
import { along, componentAxis, componentGrid, componentHint, componentTitle, zeroLines } from '~/charts/componentAxis'
import { samplesByGroup, type ComponentSample } from '~/charts/componentSamples'
import { markPath } from '~/charts/drawing'
import { escapeMarkup } from '~/charts/escapeMarkup'
import { groupLabels, type SampleGroup } from '~/charts/sampleValues'
import { formatScore } from '~/utils/formatStatistics'

/** One sample on the plot of two components. */
export interface ScorePoint { name: string, group: SampleGroup, x: number, y: number, filled: number }

export interface ScoreGroup {
  group: SampleGroup
  samples: ScorePoint[]
  /** null: fewer than five samples. */
  ellipse: GroupEllipse | null
}

/** Scores on two components (from 1) by group, with the group's ellipse. `samples` in the order they were computed in. */
export function scoreGroups(found: SampleComponents, samples: readonly ComponentSample[], across: number, upwards: number): ScoreGroup[] {
  const x = along(found.scores, across, samples.length)
  const y = along(found.scores, upwards, samples.length)
  const points = samples.map(({ name, group }, i): ScorePoint => ({ name, group, x: x[i] ?? 0, y: y[i] ?? 0, filled: found.filledOfSample[i] ?? 0 }))
  return samplesByGroup(points).map(({ group, samples: own }) => ({
    group, samples: own, ellipse: groupEllipse(own.map(point => point.x), own.map(point => point.y)),
  }))
}

export interface ScoresOptionInput {
  found: SampleComponents
  groups: readonly ScoreGroup[]
  across: number
  upwards: number
  names: SideNames
  palette: Palette
  narrow: boolean
}

/** Scores of the samples on two components, each group with its own shape, ellipses behind the marks. */
export function scoresOption({ found, groups, across, upwards, names, palette, narrow }: ScoresOptionInput): EChartsOption {
  const marks = groups.map((group, at) => scoreSeries(group, palette, at === 0))
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    grid: componentGrid(palette),
    xAxis: componentAxis(palette, componentTitle(found, across), { gap: 26, narrow }),
    yAxis: componentAxis(palette, componentTitle(found, upwards), { gap: 40, narrow: false }),
    tooltip: {
      ...componentHint(palette),
      formatter: (parameters) => {
        const mark = Array.isArray(parameters) ? parameters[0] : parameters
        const group = groups.find(each => `score-${each.group}` === mark?.seriesId)
        const point = group?.samples[mark?.dataIndex ?? -1]
        return point ? scoreHint(point, found, across, upwards, names).map(escapeMarkup).join('<br>') : ''
      },
    },
    series: [...groups.flatMap(group => ellipseSeries(group, palette)), ...marks],
  }
}

function scoreSeries({ group, samples }: ScoreGroup, palette: Palette, first: boolean): ScatterSeriesOption {
  const { shape, ink } = groupLook[group]
  const color = palette[ink]
  return {
    type: 'scatter', id: `score-${group}`, name: group, z: 3, animation: false, cursor: 'default',
    symbol: `path://${markPath(shape, 5, 5, 5)}`, symbolSize: 11,
    itemStyle: shape === 'cross' ? { color: 'transparent', borderColor: color, borderWidth: 2, opacity: 1 } : { color, borderColor: palette.panel, borderWidth: 1, opacity: 1 },
    data: samples.map(({ x, y }) => [x, y]),
    ...(first ? { markLine: zeroLines(palette) } : {}),
  }
}

function ellipseSeries({ group, ellipse }: ScoreGroup, palette: Palette): LineSeriesOption[] {
  if (!ellipse) return []
  const color = palette[groupLook[group].ink]
  return [{
    type: 'line', id: `ellipse-${group}`, silent: true, animation: false, symbol: 'none', z: 2,
    lineStyle: { color, width: 1.5, type: group === 'B' ? [6, 3] : 'solid' }, data: ellipsePoints(ellipse),
  }]
}

function scoreHint({ name, group, x, y, filled }: ScorePoint, found: SampleComponents, across: number, upwards: number, names: SideNames): string[] {
  return [
    name,
    groupLabels(names)[group],
    `PC${across} ${formatScore(x)}${upwards > found.rank ? '' : `, PC${upwards} ${formatScore(y)}`}`,
    filled > 0 ? `${filled} of ${found.features.length} values filled in` : 'no value filled in',
  ]
}
