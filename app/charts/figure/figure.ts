import type { EChartsOption } from 'echarts'
import type { Palette } from '#shared/tokens'
import type { Drawing } from '~/charts/drawing'

/** What a chart gives so that it can be saved: the same pure functions that draw it on the page, in colours for paper. */
export interface Figure {
  /** Names the plot in the name of the file: "fold change". */
  name: string
  option?: (palette: Palette, width: number) => EChartsOption
  drawing?: (width: number) => Drawing
  /** Pixels, of an option; a drawing has its own. */
  height?: number
  /** What the axes show, with units; an option says it itself. */
  axes?: string[]
  /** Settings of this plot beside those of the comparison: "Intensity as injected". */
  settings?: string[]
  /** It draws what passes the filter. */
  isFiltered?: boolean
}

/** What stands under every figure of a page: where it comes from, and under which settings. */
export interface FigureContext {
  /** Parts of the name of the file: the comparison, its version. */
  file: string[]
  /** One line a side: its name and samples. */
  sides: string[]
  settings: string[]
  /** The filter in words. */
  filter: string
  /** Study, comparison, version. */
  origin: string
  engineVersion: string
  cautions: string[]
}

/** Pixels of a figure's drawing. */
export const FIGURE_WIDTH = 960

export const FIGURE_FORMATS = ['svg', 'png'] as const
export type FigureFormat = (typeof FIGURE_FORMATS)[number]

/** Name of a figure's file: plot, comparison and version, letters, digits and hyphens alone. */
export function figureFileName(name: string, context: FigureContext, format: FigureFormat): string {
  const words = [name, ...context.file].map(part => part.normalize('NFC').toLowerCase().replace(/[^\p{L}\p{N}]+/gu, '-').replace(/^-+|-+$/g, '').slice(0, 60))
  return `${words.filter(Boolean).join('_')}.${format}`
}
