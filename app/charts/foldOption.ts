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
  /** Little room: narrow lanes without marks of their own. */
  narrow: boolean
  /** The part of the plot of ratios that is shown; null: all of it. */
  zoom: { x: [number, number], y: [number, number] } | null
}

/** CSS pixels: of a lane, of what stands beside it, and of the axis of ratios. */
const WIDE = { lane: 64, edge: 40, axis: 48 }
const NARROW = { lane: 26, edge: 4, axis: 30 }
const TOP = 28
const BOTTOM = 44

/** Fold-change plot: ratios in the middle, on each side a lane with what only that side shows, at its reach. */
export function foldOption({ points, series, settings, names, palette, hint, narrow, zoom }: FoldOptionInput): EChartsOption {
  const text = { fontFamily: fonts.text, color: palette.muted, fontSize: 12 }
  const ratios = ratioRange(Math.max(points.widest, 2 * settings.foldLimit, 1), narrow)
  const reach = reachRange(points, settings.reachLimit)
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: text,
    grid: grids(palette, narrow),
    xAxis: [
      { ...axis(palette), type: 'value', gridIndex: 0, ...(zoom ? { min: zoom.x[0], max: zoom.x[1] } : ratios), name: `log2 ratio, ${names.b} over ${names.a}`, nameLocation: 'middle', nameGap: 26, nameTextStyle: text, axisLabel: { ...text, formatter: (value: number) => Number(value.toFixed(2)).toString().replace('-', '−') } },
      ...[1, 2].map((gridIndex): XAXisComponentOption => ({ ...axis(palette), type: 'value', gridIndex, scale: true, axisLabel: { show: false }, axisTick: { show: false }, splitLine: { show: false }, name: `only ${gridIndex === 1 ? 'A' : 'B'}`, nameLocation: 'middle', nameGap: 8, nameTextStyle: { ...text, color: gridIndex === 1 ? palette.sideA : palette.sideB } })),
    ],
    yAxis: [
      { ...ratioAxis(points, palette, narrow), ...(zoom ? { min: zoom.y[0], max: zoom.y[1] } : {}) },
      ...[1, 2].map((gridIndex): YAXisComponentOption => ({ ...axis(palette), type: 'value', gridIndex, min: reach[0], max: reach[1], interval: 1, position: gridIndex === 1 ? 'left' : 'right', splitLine: { show: false }, axisLabel: { ...text, show: !narrow, formatter: reachLabel }, axisTick: { show: !narrow }, name: 'reach', nameTextStyle: text, nameGap: 10 })),
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

function grids(palette: Palette, narrow: boolean): GridComponentOption[] {
  const common = { top: TOP, bottom: BOTTOM, show: true, backgroundColor: 'transparent', borderColor: palette.hairline, borderWidth: 1 }
  const { lane, edge, axis: room } = narrow ? NARROW : WIDE
  return [
    { ...common, left: edge + lane + room, right: edge + lane + 16 },
    { ...common, left: edge, width: lane },
    { ...common, right: edge, width: lane },
  ]
}

/** An even range around 0 whose ends are marks of the axis. */
function ratioRange(reached: number, narrow: boolean): { min: number, max: number, interval: number } {
  const steps = narrow ? 2 : 4
  const interval = [0.5, 1, 2, 3, 4, 5].find(each => each * steps >= reached * 1.02) ?? Math.ceil(reached / steps)
  return { min: -interval * steps, max: interval * steps, interval }
}

function axis(palette: Palette) {
  return { axisLine: { show: false, onZero: false }, axisTick: { lineStyle: { color: palette.hairline } }, splitLine: { lineStyle: { color: palette.hairline, opacity: 0.6 } }, minorTick: { show: false } }
}

function ratioAxis(points: FoldPoints, palette: Palette, narrow: boolean): YAXisComponentOption {
  const text = { fontFamily: fonts.text, color: palette.muted, fontSize: 12 }
  const common = { ...axis(palette), type: 'value' as const, gridIndex: 0, nameTextStyle: { ...text, align: 'left' as const }, nameGap: 10 }
  if (points.kind === 'certainty') {
    const min = points.untested > 0 ? -0.8 : 0
    return { ...common, name: 'certainty, −log10 q', min, max: Math.max(2, Math.min(MOST_CERTAIN + 0.5, Math.ceil(points.highest * 1.05))), axisLabel: { ...text, formatter: (value: number) => value < 0 ? (narrow ? '' : 'no test') : value === MOST_CERTAIN ? '15 or more' : String(value) } }
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
