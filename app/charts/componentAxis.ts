import type { SampleComponents } from '#shared/science/components/sampleComponents'
import type { Palette } from '#shared/tokens'
import { chartText, plainAxis } from '~/charts/axis'

type Found = Pick<SampleComponents, 'share' | 'rank'>

/** A share of the variance as per cent, with one decimal. */
export const variancePercent = (share: number) => `${(100 * share).toFixed(1)} %`

/** What a component explains: "PC1, 43.2 % of the variance"; `component` counts from 1. */
export function componentTitle({ share, rank }: Found, component: number): string {
  return component > rank ? `no component ${component}` : `PC${component}, ${variancePercent(share[component - 1] ?? 0)} of the variance`
}

/** The same within a sentence: "PC1 (43.2 %)". */
export function componentName({ share, rank }: Found, component: number): string {
  return component > rank ? `no component ${component}` : `PC${component} (${variancePercent(share[component - 1] ?? 0)})`
}

/** Values along a component; 0 for all where there is none such. */
export function along(lists: readonly Float64Array[], component: number, length: number): Float64Array {
  return lists[component - 1] ?? new Float64Array(length)
}

/** An axis of scores or loadings: labels at the edge, whatever lies at zero. */
export function componentAxis(palette: Palette, name: string, { gap, narrow }: { gap: number, narrow: boolean }) {
  return {
    ...plainAxis(palette, name, gap),
    type: 'value' as const,
    scale: true,
    splitNumber: narrow ? 3 : 5,
    axisLine: { show: false, onZero: false },
    axisLabel: { ...chartText(palette), formatter: axisNumber },
  }
}

/** A number on the axis, with a real minus and no more digits than it needs. */
export function axisNumber(value: number): string {
  return Number(value.toPrecision(6)).toString().replace('-', '−')
}

/** Hairlines through zero, for the first series of a plot. */
export function zeroLines(palette: Palette) {
  return {
    silent: true, symbol: 'none', animation: false, label: { show: false },
    lineStyle: { color: palette.muted, type: 'solid' as const, width: 1, opacity: 0.6 },
    data: [{ xAxis: 0 }, { yAxis: 0 }],
  }
}

/** The frame of both plots. */
export function componentGrid(palette: Palette) {
  return { left: 56, right: 16, top: 16, bottom: 44, show: true, backgroundColor: 'transparent', borderColor: palette.hairline, borderWidth: 1 }
}

/** The note under the pointer. */
export function componentHint(palette: Palette) {
  return { trigger: 'item' as const, confine: true, transitionDuration: 0, backgroundColor: palette.panel, borderColor: palette.muted, textStyle: { ...chartText(palette), color: palette.ink, fontSize: 13 }, extraCssText: 'box-shadow:none' }
}
