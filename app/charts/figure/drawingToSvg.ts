import type { Palette } from '#shared/tokens'
import { markPath, TEXT_SIZE, type Drawing, type DrawnShape } from '~/charts/drawing'
import { escapeXml } from '~/charts/figure/escapeXml'

/** A drawing of our own as SVG, in the colours of a palette; it names no font, so that it takes that of the figure. */
export function drawingToSvg({ width, height, shapes }: Drawing, palette: Palette): string {
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" fill="none">${shapes.map(shape => shapeToSvg(shape, palette)).join('')}</svg>`
}

function shapeToSvg(shape: DrawnShape, palette: Palette): string {
  const colour = palette[shape.ink]
  const title = shape.says ? `<title>${escapeXml(shape.says)}</title>` : ''
  if (shape.kind === 'line') {
    return `<path d="${shape.d}" stroke="${colour}" stroke-width="${shape.weight ?? 1}"${shape.dash ? ` stroke-dasharray="${shape.dash}"` : ''}${shape.filled ? ` fill="${colour}"` : ''}>${title}</path>`
  }
  if (shape.kind === 'mark') {
    return `<path d="${markPath(shape.shape, shape.x, shape.y, shape.size ?? 4)}" stroke="${colour}" stroke-width="1.5" fill="${shape.hollow || shape.shape === 'cross' ? 'none' : colour}">${title}</path>`
  }
  const turned = shape.turned ? ` transform="rotate(-90 ${shape.x} ${shape.y})"` : ''
  return `<text x="${shape.x}" y="${shape.y}" fill="${colour}" font-size="${shape.size ?? TEXT_SIZE}" text-anchor="${shape.anchor ?? 'start'}"${shape.strong ? ' font-weight="600"' : ''}${turned}>${escapeXml(shape.text)}${title}</text>`
}
