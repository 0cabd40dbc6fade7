import type { EChartsOption, ScatterSeriesOption } from 'echarts'
import type { SampleComponents } from '#shared/science/components/sampleComponents'
import { VERDICT, type Verdict } from '#shared/science/verdict/verdicts'
import type { Palette } from '#shared/tokens'
import { chartText } from '~/charts/axis'
import { along, axisNumber, componentAxis, componentGrid, componentTitle, zeroLines } from '~/charts/componentAxis'
import type { LoadingFrame } from '~/charts/loadingFrame'
import { verdictMarks } from '~/charts/verdictMarks'

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
    return verdictMarks(name, palette, features.length).map((mark, part): LoadingSeries => ({
      features: own.map(k => features[k]!),
      option: { ...mark, type: 'scatter', id: `loading-${name}-${part}`, name, data, dimensions: ['x', 'y'], large: true, largeThreshold: 0, progressive: 0, animation: false, silent: true, emphasis: { disabled: true } },
    }))
  })
}

export interface LoadingsOptionInput {
  found: SampleComponents
  frame: LoadingFrame
  series: readonly LoadingSeries[]
  across: number
  upwards: number
  palette: Palette
}

/** How each feature weighs in two components. The drawing answers no pointer: what lies over it does. */
export function loadingsOption({ found, frame, series, across, upwards, palette }: LoadingsOptionInput): EChartsOption {
  const { pane, interval } = frame
  const limits = (ends: [number, number], step: number | undefined) => ({
    min: ends[0], max: ends[1], ...(step === undefined ? { axisLabel: { ...chartText(palette), formatter: axisNumber, showMinLabel: false, showMaxLabel: false } } : { interval: step }),
  })
  return {
    animation: false,
    aria: { enabled: false },
    textStyle: chartText(palette),
    grid: { ...componentGrid(palette), left: pane.left, top: pane.top, width: pane.width, height: pane.height },
    xAxis: { ...componentAxis(palette, `loading on ${componentTitle(found, across)}`, { gap: 26, narrow: false }), ...limits(pane.x, interval?.x) },
    yAxis: { ...componentAxis(palette, `loading on ${componentTitle(found, upwards)}`, { gap: 40, narrow: false }), ...limits(pane.y, interval?.y) },
    series: [
      // Lines need a series of their own: large ones draw nothing else.
      { type: 'scatter', id: 'zero', silent: true, animation: false, data: [], markLine: zeroLines(palette) },
      ...series.map(each => each.option),
    ],
  }
}
