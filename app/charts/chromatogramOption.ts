import type { LineSeriesOption, ScatterSeriesOption } from 'echarts/charts'
import type { EChartsOption } from 'echarts'
import { downSample } from '#shared/science/traces/downSample'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { Palette } from '#shared/tokens'
import { chartText, plainAxis } from '~/charts/axis'
import type { Curve } from '~/charts/chromatogramCurves'
import { chooseLabels, type LabelledMark, type PeakMark } from '~/charts/chromatogramLabels'
import { plotFrame, plotWidth } from '~/charts/chromatogramWindow'
import { formatIntensity } from '~/utils/formatMeasures'
import type { TimeWindow, TraceScale } from '~/utils/traceView'

/** Dashes of the features looked at, in their order, CSS pixels; they begin anew after the last. */
export const DASHES: readonly (readonly number[])[] = [[], [7, 3], [2, 2], [10, 3, 2, 3], [4, 4], [12, 4, 4, 4]]

/** All lines together are drawn with some so many points at most. */
const MOST_POINTS = 120_000
/** No line is drawn on fewer columns than this, however many there are. */
const FEWEST_COLUMNS = 150

/** A label this near needs no line to its mark, CSS pixels. */
const GAP_WITHOUT_LEADER = 4

export interface ChromatogramInput {
  curves: readonly Curve[]
  /** Features looked at, in the order in which their dashes go. */
  looked: readonly number[]
  marks: readonly PeakMark[]
  window: TimeWindow
  scale: TraceScale
  /** The comparison weighs by amount, so that values are no longer counts. */
  byAmount: boolean
  divertWindows: readonly { startMinutes: number, endMinutes: number }[]
  names: SideNames
  palette: Palette
  /** Size of the drawing, CSS pixels. */
  width: number
  height: number
  narrow: boolean
}

/** Side A upwards, side B downwards on one time axis; samples thin, means strong; only as many points as can be seen. */
export function chromatogramOption(input: ChromatogramInput): EChartsOption {
  const { curves, window, scale, byAmount, palette, names, narrow, width, height, marks } = input
  const frame = plotFrame(narrow)
  const plot = { width: plotWidth(width, frame), height: height - frame.top - frame.bottom }
  const columns = Math.max(FEWEST_COLUMNS, Math.min(plot.width, Math.floor(MOST_POINTS / 4 / Math.max(1, curves.length))))
  const drawn = curves.map(curve => ({ curve, ...pointsOf(curve, window, columns) }))
  const { highest, step } = valueRange(Math.max(...drawn.map(each => each.highest), 0))
  const corner = { left: 0, right: Math.max(names.a.length, names.b.length) * 8 + 24 }
  const topBetween = (side: 'A' | 'B', from: number, to: number) => Math.max(0, ...drawn.map(({ curve, data }) => curve.side === side ? topOfPairs(data, from, to) : 0))
  const labels = chooseLabels(marks, { ...plot, fromMinutes: window[0], toMinutes: window[1], highest }, topBetween, [{ ...corner, top: 0, bottom: 22 }, { ...corner, top: plot.height - 22, bottom: plot.height }])
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    // The drawing must not make room of its own for labels: the brush over it goes by the same frame.
    grid: { ...frame, outerBoundsMode: 'none', show: true, borderColor: palette.hairline },
    xAxis: { ...plainAxis(palette, 'retention time, minutes', 26), type: 'value', min: window[0], max: window[1], splitLine: { show: false }, axisLine: { onZero: false, lineStyle: { color: palette.muted } }, axisLabel: { ...chartText(palette), showMinLabel: false, showMaxLabel: false, formatter: (value: number) => Number(value.toFixed(3)).toString() } },
    yAxis: { ...plainAxis(palette, narrow ? '' : valueName(scale, byAmount), 56), type: 'value', min: -highest, max: highest, interval: step, splitLine: { lineStyle: { color: palette.hairline, opacity: 0.6 } }, axisLabel: { ...chartText(palette), formatter: (value: number) => valueLabel(Math.abs(value), scale) } },
    series: [
      ...drawn.map(({ curve, data }, i) => lineSeries(curve, data, i, input)),
      middleLine(input),
      markSeries(labels, palette),
      leaders(labels, highest / plot.height * 2, palette),
      sideNames(names, window, highest, palette),
    ],
  }
}

/** What the values are. */
export const valueName = (scale: TraceScale, byAmount: boolean) => scale === 'own' ? '% of each highest' : byAmount ? 'intensity, normalised' : 'intensity, counts'

/** No line goes beyond its own 100 %: what stands above is room for labels. */
const valueLabel = (value: number, scale: TraceScale) => scale !== 'own' ? formatIntensity(value) : value > 100.5 ? '' : `${Math.round(value)} %`

/** The points to draw, as pairs with side B turned down, and the highest within the window. */
function pointsOf({ side, minutes, values }: Curve, [fromMinutes, toMinutes]: TimeWindow, columns: number): { data: Float64Array, highest: number } {
  const kept = downSample(minutes, values, { fromMinutes, toMinutes, columns })
  const data = new Float64Array(kept.length * 2)
  const sign = side === 'A' ? 1 : -1
  let highest = 0
  for (let k = 0; k < kept.length; k++) {
    const time = minutes[kept[k]!]!
    const value = values[kept[k]!]!
    data[2 * k] = time
    data[2 * k + 1] = sign * value
    if (value > highest && time >= fromMinutes && time <= toMinutes) highest = value
  }
  return { data, highest }
}

/** Up to a whole number of steps of the axis, three to six to each side, with room for labels above the highest point. */
function valueRange(top: number): { highest: number, step: number } {
  if (!(top > 0)) return { highest: 1, step: 0.5 }
  const needed = top * 1.2
  const power = 10 ** Math.floor(Math.log10(needed / 2.5))
  const step = ([5, 2, 1].find(each => each * power <= needed / 2.5) ?? 1) * power
  return { highest: Math.ceil(needed / step) * step, step }
}

/** The highest of pairs between two times, as a height. */
function topOfPairs(pairs: Float64Array, from: number, to: number): number {
  let top = 0
  for (let i = 0; i < pairs.length; i += 2) if (pairs[i]! >= from && pairs[i]! <= to && Math.abs(pairs[i + 1]!) > top) top = Math.abs(pairs[i + 1]!)
  return top
}

function lineSeries({ side, sampleName, feature }: Curve, data: Float64Array, place: number, { palette, looked }: ChromatogramInput): LineSeriesOption {
  const dash = feature === null || sampleName !== null ? [] : DASHES[looked.indexOf(feature) % DASHES.length] ?? []
  return {
    // Pairs in one typed array are drawn as well; the types only speak of them for scatter.
    type: 'line', id: `line-${place}`, name: sampleName ?? `mean of ${side}`, data: data as unknown as LineSeriesOption['data'], dimensions: ['minutes', 'value'],
    showSymbol: false, silent: true, animation: false, emphasis: { disabled: true }, z: sampleName === null ? 3 : 2,
    lineStyle: { color: side === 'A' ? palette.sideA : palette.sideB, width: sampleName === null ? 2 : 1, opacity: sampleName === null ? 1 : 0.5, type: dash.length > 0 ? [...dash] : 'solid' },
  }
}

/** The line between the sides, and what is sent to waste. */
function middleLine({ palette, window, divertWindows }: ChromatogramInput): LineSeriesOption {
  const shaded = divertWindows.flatMap(({ startMinutes, endMinutes }) => {
    const [from, to] = [Math.max(startMinutes, window[0]), Math.min(endMinutes, window[1])]
    return from < to ? [[{ xAxis: from, name: 'to waste' }, { xAxis: to }] as [{ xAxis: number, name: string }, { xAxis: number }]] : []
  })
  return {
    type: 'line', id: 'middle', data: [[window[0], 0], [window[1], 0]], showSymbol: false, silent: true, animation: false, z: 4,
    lineStyle: { color: palette.muted, width: 1 },
    markArea: { silent: true, animation: false, itemStyle: { color: palette.aside, opacity: 0.18 }, label: { color: palette.muted, fontSize: 11, position: 'inside', offset: [72, 0], rotate: 90, fontFamily: chartText(palette).fontFamily }, data: shaded },
  }
}

const SYMBOL = { selected: 'circle', picked: 'circle', flagged: 'diamond' } as const

/** Selected: full; looked at beside it: a ring; flagged: in ink. */
function markStyle(why: PeakMark['why'], palette: Palette) {
  if (why === 'picked') return { color: palette.panel, borderColor: palette.focus, borderWidth: 2 }
  return { color: why === 'flagged' ? palette.ink : palette.focus, borderColor: palette.panel, borderWidth: 1 }
}

function markSeries(labels: readonly LabelledMark[], palette: Palette): ScatterSeriesOption {
  return {
    type: 'scatter', id: 'marks', silent: true, animation: false, z: 6,
    data: labels.map(({ side, minutes, height, why, text, lift }) => ({
      value: [minutes, side === 'A' ? height : -height], name: text, symbol: SYMBOL[why], symbolSize: why === 'flagged' ? 9 : 7,
      itemStyle: markStyle(why, palette),
      label: { show: true, position: side === 'A' ? 'top' as const : 'bottom' as const, distance: 5 + lift, formatter: text, color: why === 'selected' ? palette.focus : palette.ink, fontWeight: why === 'selected' ? 'bold' as const : 'normal' as const, fontSize: 12, fontFamily: chartText(palette).fontFamily, textBorderColor: palette.panel, textBorderWidth: 3 },
    })),
  }
}

/** From a mark to its label, where that stands off. */
function leaders(labels: readonly LabelledMark[], perPixel: number, palette: Palette): LineSeriesOption {
  const data = labels.filter(({ lift }) => lift > GAP_WITHOUT_LEADER).flatMap(({ side, minutes, height, lift }) => {
    const sign = side === 'A' ? 1 : -1
    return [[minutes, sign * height], [minutes, sign * (height + lift * perPixel)], [minutes, Number.NaN]]
  })
  return { type: 'line', id: 'leaders', data, showSymbol: false, silent: true, animation: false, z: 5, lineStyle: { color: palette.muted, width: 1, type: [2, 2] } }
}

function sideNames(names: SideNames, window: TimeWindow, highest: number, palette: Palette): ScatterSeriesOption {
  const name = (text: string, value: number, colour: string, baseline: 'top' | 'bottom') => ({
    value: [window[0], value], symbolSize: 0.1, itemStyle: { color: 'transparent' },
    label: { show: true, position: 'right' as const, offset: [4, baseline === 'top' ? 12 : -12], formatter: text, color: colour, fontWeight: 'bold' as const, fontSize: 13, fontFamily: chartText(palette).fontFamily, textBorderColor: palette.panel, textBorderWidth: 3 },
  })
  return { type: 'scatter', id: 'sides', silent: true, animation: false, z: 7, clip: false, data: [name(`A ${names.a}`, highest, palette.sideA, 'top'), name(`B ${names.b}`, -highest, palette.sideB, 'bottom')] }
}
