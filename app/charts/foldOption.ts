import type { EChartsOption, GridComponentOption, XAXisComponentOption, YAXisComponentOption } from 'echarts'
import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { fonts, type Palette } from '#shared/tokens'
import { MOST_CERTAIN, type FoldPoints } from '~/charts/foldPoints'
import type { FoldSeries } from '~/charts/foldSeries'
import { limitLines } from '~/charts/limitLines'

export interface FoldOptionInput {
  points: FoldPoints
  series: readonly FoldSeries[]
  settings: Pick<ComparisonSettings, 'foldLimit' | 'alpha' | 'reachLimit'>
  names: SideNames
  palette: Palette
  /** What the mark of a feature says under the pointer; plain lines, escaped here. */
  hint: (feature: number) => string[]
  /** The part of the plot of ratios that is shown; null: all of it. */
  zoom: { x: [number, number], y: [number, number] } | null
}

const LANE_WIDTH = 64
const TOP = 28
const BOTTOM = 44
/** CSS pixels from the chart's left edge to each grid. */
const RATIOS_LEFT = LANE_WIDTH + 84

/** Fold-change plot: ratios in the middle, on each side a lane with what only that side shows, at its reach. */
export function foldOption({ points, series, settings, names, palette, hint, zoom }: FoldOptionInput): EChartsOption {
  const text = { fontFamily: fonts.text, color: palette.muted, fontSize: 12 }
  const widest = Math.ceil(Math.max(points.widest, 2 * settings.foldLimit, 1) * 1.04)
  const reach = reachRange(points, settings.reachLimit)
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: text,
    grid: grids(palette),
    xAxis: [
      { ...axis(palette), type: 'value', gridIndex: 0, min: zoom?.x[0] ?? -widest, max: zoom?.x[1] ?? widest, name: `log2 ratio, ${names.b} over ${names.a}`, nameLocation: 'middle', nameGap: 26, nameTextStyle: text, axisLabel: { ...text, formatter: (value: number) => Number(value.toFixed(2)).toString().replace('-', '−') } },
      ...[1, 2].map((gridIndex): XAXisComponentOption => ({ ...axis(palette), type: 'value', gridIndex, scale: true, axisLabel: { show: false }, axisTick: { show: false }, splitLine: { show: false }, name: `only ${gridIndex === 1 ? 'A' : 'B'}`, nameLocation: 'middle', nameGap: 8, nameTextStyle: { ...text, color: gridIndex === 1 ? palette.sideA : palette.sideB } })),
    ],
    yAxis: [
      { ...ratioAxis(points, palette), ...(zoom ? { min: zoom.y[0], max: zoom.y[1] } : {}) },
      ...[1, 2].map((gridIndex): YAXisComponentOption => ({ ...axis(palette), type: 'value', gridIndex, min: reach[0], max: reach[1], interval: 1, position: gridIndex === 1 ? 'left' : 'right', splitLine: { show: false }, axisLabel: { ...text, formatter: reachLabel }, name: 'reach', nameTextStyle: text, nameGap: 10 })),
    ],
    tooltip: {
      trigger: 'item', confine: true, transitionDuration: 0, backgroundColor: palette.panel, borderColor: palette.muted, textStyle: { ...text, color: palette.ink, fontSize: 13 }, extraCssText: 'box-shadow:none',
      formatter: (parameters) => {
        const mark = Array.isArray(parameters) ? parameters[0] : parameters
        const feature = series.find(each => each.option.id === mark?.seriesId)?.features[mark?.dataIndex ?? -1]
        return feature === undefined ? '' : hint(feature).map(escapeMarkup).join('<br>')
      },
    },
    series: [...series.map(each => each.option), ...limitLines(points, settings, palette)],
  }
}

function grids(palette: Palette): GridComponentOption[] {
  const common = { top: TOP, bottom: BOTTOM, show: true, backgroundColor: 'transparent', borderColor: palette.hairline, borderWidth: 1 }
  return [
    { ...common, left: RATIOS_LEFT, right: RATIOS_LEFT - 32 },
    { ...common, left: 36, width: LANE_WIDTH },
    { ...common, right: 36, width: LANE_WIDTH },
  ]
}

function axis(palette: Palette) {
  return { axisLine: { show: false, onZero: false }, axisTick: { lineStyle: { color: palette.hairline } }, splitLine: { lineStyle: { color: palette.hairline, opacity: 0.6 } }, minorTick: { show: false } }
}

function ratioAxis(points: FoldPoints, palette: Palette): YAXisComponentOption {
  const text = { fontFamily: fonts.text, color: palette.muted, fontSize: 12 }
  const common = { ...axis(palette), type: 'value' as const, gridIndex: 0, nameTextStyle: { ...text, align: 'left' as const }, nameGap: 10 }
  if (points.kind === 'certainty') {
    const min = points.untested > 0 ? -0.8 : 0
    return { ...common, name: 'certainty, −log10 q', min, max: Math.max(2, Math.min(MOST_CERTAIN + 0.5, Math.ceil(points.highest * 1.05))), axisLabel: { ...text, formatter: (value: number) => value < 0 ? 'no test' : value === MOST_CERTAIN ? '15 or more' : String(value) } }
  }
  return { ...common, name: 'abundance', min: Math.floor(orZero(points.lowest)), max: Math.ceil(orZero(points.highest)) + 0.1, interval: 1, axisLabel: { ...text, formatter: (value: number) => Number.isInteger(value) ? powerOfTen(value) : '' } }
}

const orZero = (value: number) => Number.isFinite(value) ? value : 0

function reachRange(points: FoldPoints, reachLimit: number): [number, number] {
  const limit = Math.log10(reachLimit)
  const low = Number.isNaN(points.lowestReach) ? limit : Math.min(points.lowestReach, limit)
  const high = Number.isNaN(points.highestReach) ? limit : Math.max(points.highestReach, limit)
  return [Math.min(0, Math.floor(low)), Math.max(2, Math.ceil(high * 1.02))]
}

function reachLabel(value: number): string {
  return value >= 0 && value < 4 ? `×${10 ** value}` : `×${powerOfTen(value)}`
}

const SUPERSCRIPT = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹']
function powerOfTen(exponent: number): string {
  return `10${exponent < 0 ? '⁻' : ''}${[...String(Math.abs(exponent))].map(digit => SUPERSCRIPT[Number(digit)] ?? '').join('')}`
}

const MARKUP: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' }
/** Names of sides are typed by people, and the hint is markup. */
export function escapeMarkup(text: string): string {
  return text.replace(/[&<>"']/g, sign => MARKUP[sign] ?? '')
}
