import type { EChartsOption, ScatterSeriesOption } from 'echarts'
import type { SampleComponents } from '#shared/science/components/sampleComponents'
import { VERDICT, type Verdict } from '#shared/science/verdict/verdicts'
import type { Palette } from '#shared/tokens'
import { chartText } from '~/charts/axis'
import { along, axisNumber, componentAxis, componentGrid, componentHint, componentTitle, zeroLines } from '~/charts/componentAxis'
import { escapeMarkup } from '~/charts/escapeMarkup'
import { verdictMarks } from '~/charts/verdictMarks'
import type { PlotWindow } from '~/utils/plotWindow'

/** Loadings on two components, in the order of `features`. */
export interface LoadingPoints {
  /** Places in the alignment. */
  features: Int32Array
  x: Float64Array
  y: Float64Array
  /** Samples whose value was filled in. */
  filled: Int32Array
}

/** Loadings on two components (from 1), of the features among `rows` (those that pass the filter). */
export function loadingPoints(found: SampleComponents, rows: Int32Array, across: number, upwards: number): LoadingPoints {
  const x = along(found.loadings, across, found.features.length)
  const y = along(found.loadings, upwards, found.features.length)
  const passing = new Uint8Array(1 + Math.max(found.features.at(-1) ?? 0, rows.reduce((last, feature) => Math.max(last, feature), 0)))
  for (const feature of rows) passing[feature] = 1
  const kept = Int32Array.from(found.features.keys()).filter(k => passing[found.features[k]!] === 1)
  return {
    features: kept.map(k => found.features[k]!),
    x: Float64Array.from(kept, k => x[k]!),
    y: Float64Array.from(kept, k => y[k]!),
    filled: kept.map(k => found.filledOfFeature[k]!),
  }
}

/** The surroundings of a feature: an eighth of the plot to each side; null where it is not on it. */
export function aroundLoading({ features, x, y }: LoadingPoints, feature: number): PlotWindow | null {
  const k = features.indexOf(feature)
  if (k < 0) return null
  const ends = (values: Float64Array): [number, number] => {
    const half = (values.reduce((high, value) => Math.max(high, value)) - values.reduce((low, value) => Math.min(low, value))) / 8 || 0.01
    return [values[k]! - half, values[k]! + half]
  }
  return { x: ends(x), y: ends(y) }
}

/** One drawn series and the features behind its points. */
export interface LoadingSeries { option: ScatterSeriesOption, features: Int32Array }

/** Later ones lie on top: what differs above what is level. */
const DRAWN: readonly Verdict[] = ['unsettled', 'level', 'moreA', 'moreB', 'onlyA', 'onlyB']

/** One series a verdict, marked as everywhere on the bench. */
export function loadingSeries({ features, x, y }: LoadingPoints, verdict: Uint8Array, palette: Palette): LoadingSeries[] {
  const all = Int32Array.from(features.keys())
  return DRAWN.flatMap((name) => {
    const own = all.filter(k => verdict[features[k]!] === VERDICT[name])
    if (own.length === 0) return []
    const data = new Float64Array(2 * own.length)
    own.forEach((k, at) => {
      data[2 * at] = x[k]!
      data[2 * at + 1] = y[k]!
    })
    return verdictMarks(name, palette).map((mark, part): LoadingSeries => ({
      features: own.map(k => features[k]!),
      option: { ...mark, type: 'scatter', id: `loading-${name}-${part}`, name, data, dimensions: ['x', 'y'], large: true, largeThreshold: 0, progressive: 0, animation: false, emphasis: { disabled: true } },
    }))
  })
}

export interface LoadingsOptionInput {
  found: SampleComponents
  series: readonly LoadingSeries[]
  across: number
  upwards: number
  palette: Palette
  /** What the mark of a feature says under the pointer; plain lines, escaped here. */
  hint: (feature: number) => string[]
  narrow: boolean
  /** The part that is shown; null: all of it. */
  shown: PlotWindow | null
}

/** How each feature weighs in two components. */
export function loadingsOption({ found, series, across, upwards, palette, hint, narrow, shown }: LoadingsOptionInput): EChartsOption {
  const limits = (ends: [number, number] | undefined) => ends ? { min: ends[0], max: ends[1], axisLabel: { ...chartText(palette), showMinLabel: false, showMaxLabel: false, formatter: axisNumber } } : {}
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    grid: componentGrid(palette),
    xAxis: { ...componentAxis(palette, `loading on ${componentTitle(found, across)}`, { gap: 26, narrow }), ...limits(shown?.x) },
    yAxis: { ...componentAxis(palette, `loading on ${componentTitle(found, upwards)}`, { gap: 40, narrow: false }), ...limits(shown?.y) },
    tooltip: {
      ...componentHint(palette),
      formatter: (parameters) => {
        const mark = Array.isArray(parameters) ? parameters[0] : parameters
        const feature = series.find(each => each.option.id === mark?.seriesId)?.features[mark?.dataIndex ?? -1]
        return feature === undefined ? '' : hint(feature).map(escapeMarkup).join('<br>')
      },
    },
    series: [
      // Lines need a series of their own: large ones draw nothing else.
      { type: 'scatter', id: 'zero', silent: true, animation: false, data: [], markLine: zeroLines(palette) },
      ...series.map(each => each.option),
    ],
  }
}
