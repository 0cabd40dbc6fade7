import { light } from '#shared/tokens'
import { composeFigure } from '~/charts/figure/composeFigure'
import { drawingToSvg } from '~/charts/figure/drawingToSvg'
import { FIGURE_WIDTH, type Figure, type FigureContext } from '~/charts/figure/figure'
import { axisNames, figureCaption } from '~/charts/figure/figureCaption'
import { optionToSvg } from '~/charts/figure/optionToSvg'

const DEFAULT_HEIGHT = 420

/** A chart as a figure for paper, with its caption. `fontUrl` is the text font as data URL. */
export function drawFigure(figure: Figure, { title, description, context, date, fontUrl }: { title: string, description: string, context: FigureContext, date: Date, fontUrl: string | null }): { svg: string, width: number, height: number } {
  const common = { title, description, fontUrl }
  if (figure.drawing) {
    const drawing = figure.drawing(FIGURE_WIDTH)
    return composeFigure({ ...common, drawing: drawingToSvg(drawing, light), width: drawing.width, height: drawing.height, caption: figureCaption(figure, context, [], date) })
  }
  if (!figure.option) throw new Error(`The figure "${figure.name}" has nothing to draw.`)
  const option = figure.option(light, FIGURE_WIDTH)
  const height = figure.height ?? DEFAULT_HEIGHT
  return composeFigure({ ...common, drawing: optionToSvg(option, FIGURE_WIDTH, height), width: FIGURE_WIDTH, height, caption: figureCaption(figure, context, axisNames(option), date) })
}
