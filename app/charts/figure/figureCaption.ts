import type { EChartsOption } from 'echarts'
import type { Figure, FigureContext } from '~/charts/figure/figure'

export interface CaptionLine { term: string, text: string }

/** What stands under a figure, so that it explains itself on any page it is pasted into. */
export function figureCaption(figure: Pick<Figure, 'axes' | 'settings' | 'isFiltered'>, context: FigureContext, axes: readonly string[], date: Date): CaptionLine[] {
  const lines: CaptionLine[] = [
    { term: 'Axes', text: [...figure.axes ?? axes].join('; ') },
    ...context.sides.map((text, i) => ({ term: i === 0 ? 'Sides' : '', text })),
    { term: 'Settings', text: [...figure.settings ?? [], ...context.settings].map(each => each.replace(/\.$/, '')).join('; ') },
    { term: 'Filter', text: figure.isFiltered ? context.filter : '' },
    { term: 'From', text: `${context.origin}; engine ${context.engineVersion}; drawn ${date.toISOString().slice(0, 10)}` },
    ...context.cautions.map((text, i) => ({ term: i === 0 ? 'Caution' : '', text })),
  ]
  return lines.filter(({ text }) => text !== '')
}

/** Names of the axes of an option, across and up; each once. */
export function axisNames(option: EChartsOption): string[] {
  const namesOf = (axes: unknown) => [axes].flat().flatMap(axis => typeof axis === 'object' && axis !== null && 'name' in axis && typeof axis.name === 'string' && axis.name !== '' ? [axis.name] : [])
  return [['across', namesOf(option.xAxis)], ['up', namesOf(option.yAxis)]].flatMap(([where, names]) => names && names.length > 0 ? [`${String(where)}: ${[...new Set(names)].join(', ')}`] : [])
}
