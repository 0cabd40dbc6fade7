import type { EChartsOption, GridComponentOption, XAXisComponentOption, YAXisComponentOption } from 'echarts'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { Palette } from '#shared/tokens'
import { chartText } from '~/charts/axis'
import { PANES, type FoldFrame } from '~/charts/foldFrame'
import { MOST_CERTAIN, type FoldPoints } from '~/charts/foldPoints'
import type { FoldSeries } from '~/charts/foldSeries'
import { limitLines } from '~/charts/limitLines'
import { formatIntensity } from '~/utils/formatMeasures'

export interface FoldOptionInput {
  points: FoldPoints
  /** Where the panes lie, and what they reach from and to. */
  frame: FoldFrame
  series: readonly FoldSeries[]
  settings: Pick<ComparisonSettings, 'foldLimit' | 'alpha' | 'reachLimit'>
  names: SideNames
  palette: Palette
  /** Write the values of the limits at their lines; not where handles over the drawing say them. */
  limitLabels: boolean
}

/**
 * Fold-change plot: ratios in the middle, on each side a lane with what only that side shows, at its reach. Nothing in it
 * answers the pointer: what lies under it is found by `pointGrid` and told by the page, without drawing anew.
 */
export function foldOption({ points, frame, series, settings, names, palette, limitLabels }: FoldOptionInput): EChartsOption {
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    grid: PANES.map((name): GridComponentOption => {
      const { left, top, width, height } = frame.panes[name]
      return { left, top, width, height, show: true, backgroundColor: 'transparent', borderColor: palette.hairline, borderWidth: 1, outerBoundsMode: 'none' }
    }),
    xAxis: [ratioAxis(frame, names, palette), massAxis(frame, 1, palette), massAxis(frame, 2, palette)],
    yAxis: [heightAxis(points, frame, palette), reachAxis(frame, 1, palette), reachAxis(frame, 2, palette)],
    series: [...series.map(each => each.option), ...limitLines(points, settings, palette, limitLabels)],
  }
}

function axis(palette: Palette) {
  return { axisLine: { show: false, onZero: false }, axisTick: { lineStyle: { color: palette.hairline } }, splitLine: { lineStyle: { color: palette.hairline, opacity: 0.6 } }, minorTick: { show: false } }
}

const minus = (value: number) => Number(value.toFixed(2)).toString().replace('-', '−')
/** The ends of a window fall between marks; their labels would crowd the others. */
const endLabels = (shown: boolean) => ({ showMinLabel: shown, showMaxLabel: shown })

function ratioAxis({ panes: { ratios }, narrow }: FoldFrame, names: SideNames, palette: Palette): XAXisComponentOption {
  const text = chartText(palette)
  return {
    ...axis(palette), type: 'value', gridIndex: 0, min: ratios.x[0], max: ratios.x[1], ...(ratios.interval ? { interval: ratios.interval } : {}), splitNumber: narrow ? 4 : 8,
    name: `log2 ratio, ${names.b} over ${names.a}`, nameLocation: 'middle', nameGap: 26, nameTextStyle: text, axisLabel: { ...text, ...endLabels(ratios.interval !== undefined), formatter: minus },
  }
}

function heightAxis(points: FoldPoints, { panes: { ratios }, narrow }: FoldFrame, palette: Palette): YAXisComponentOption {
  const text = chartText(palette)
  const common = { ...axis(palette), type: 'value' as const, gridIndex: 0, min: ratios.y[0], max: ratios.y[1], nameTextStyle: { ...text, align: 'left' as const }, nameGap: 14 }
  const isWhole = ratios.interval !== undefined
  if (points.kind === 'certainty') {
    return { ...common, name: narrow ? '−log10 q' : 'certainty, −log10 q', axisLabel: { ...text, ...(isWhole ? {} : endLabels(false)), formatter: (value: number) => value < 0 ? (narrow || !isWhole ? '' : 'no test') : value === MOST_CERTAIN ? (narrow ? '≥ 15' : '15 or more') : minus(value) } }
  }
  return { ...common, name: 'abundance', ...(isWhole ? { interval: 1 } : {}), axisLabel: { ...text, ...(isWhole ? {} : endLabels(false)), formatter: (value: number) => Number.isInteger(value) ? powerOfTen(value) : isWhole ? '' : formatIntensity(10 ** value) } }
}

function massAxis({ panes, narrow }: FoldFrame, gridIndex: 1 | 2, palette: Palette): XAXisComponentOption {
  const { x } = panes[gridIndex === 1 ? 'laneA' : 'laneB']
  const text = chartText(palette)
  return {
    ...axis(palette), type: 'value', gridIndex, min: x[0], max: x[1], splitNumber: 3, splitLine: { show: false }, axisTick: { show: false },
    axisLabel: { ...text, ...endLabels(false), hideOverlap: true, formatter: (value: number) => String(value) }, name: `${narrow ? 'found ' : ''}only in ${gridIndex === 1 ? 'A' : 'B'}, m/z`, nameLocation: 'middle', nameGap: 26, nameTextStyle: { ...text, color: gridIndex === 1 ? palette.sideA : palette.sideB },
  }
}

function reachAxis({ panes, narrow }: FoldFrame, gridIndex: 1 | 2, palette: Palette): YAXisComponentOption {
  const { y } = panes[gridIndex === 1 ? 'laneA' : 'laneB']
  const text = chartText(palette)
  const left = gridIndex === 1 || narrow
  return { ...axis(palette), type: 'value', gridIndex, min: y[0], max: y[1], interval: 1, position: left ? 'left' : 'right', axisLabel: { ...text, formatter: reachLabel }, splitLine: { show: true, lineStyle: { color: palette.hairline, opacity: 0.6 } }, name: 'reach', nameTextStyle: text, nameGap: 14 }
}

function reachLabel(value: number): string {
  return value >= 0 && value < 4 ? `×${10 ** value}` : `×${powerOfTen(value)}`
}

const SUPERSCRIPT = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹']
function powerOfTen(exponent: number): string {
  return `10${exponent < 0 ? '⁻' : ''}${[...String(Math.abs(exponent))].map(digit => SUPERSCRIPT[Number(digit)] ?? '').join('')}`
}
