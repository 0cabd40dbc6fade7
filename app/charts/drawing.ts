import type { Palette } from '#shared/tokens'

/** A colour by its token, so that screen, print and figure each take their own value. */
export type Ink = keyof Palette
export type MarkShape = 'circle' | 'square' | 'cross' | 'diamond' | 'triangle'

/** What a drawing is made of; coordinates in pixels of the drawing, and always finite. `says` is told under the pointer. */
export type DrawnShape =
  | { kind: 'line', d: string, ink: Ink, weight?: number, dash?: string, filled?: boolean, says?: string }
  | { kind: 'mark', shape: MarkShape, x: number, y: number, ink: Ink, size?: number, hollow?: boolean, says?: string }
  | { kind: 'text', x: number, y: number, text: string, ink: Ink, anchor?: 'start' | 'middle' | 'end', size?: number, strong?: boolean, turned?: boolean, says?: string }

/** A drawing of our own, laid out by a pure function: shown by DrawingSvg, written to a file by drawingToSvg. */
export interface Drawing { width: number, height: number, shapes: DrawnShape[] }

export const TEXT_SIZE = 12

/** About so wide is a text; no font is measured, so that the layout is the same everywhere. */
export const textWidth = (text: string, size = TEXT_SIZE) => text.length * size * 0.56

/** The text cut to a width, with a sign that it was. */
export function fitText(text: string, width: number, size = TEXT_SIZE): string {
  const most = Math.max(1, Math.floor(width / (size * 0.56)))
  return text.length <= most ? text : `${text.slice(0, most - 1)}…`
}

/** Outline of a mark around (x, y); `half` is half its width. */
export function markPath(shape: MarkShape, x: number, y: number, half: number): string {
  switch (shape) {
    case 'circle': return `M${round(x - half)} ${round(y)}a${half} ${half} 0 1 0 ${2 * half} 0a${half} ${half} 0 1 0 ${-2 * half} 0z`
    case 'square': return `M${round(x - half)} ${round(y - half)}h${2 * half}v${2 * half}h${-2 * half}z`
    case 'cross': return `M${round(x - half)} ${round(y - half)}l${2 * half} ${2 * half}m0 ${-2 * half}l${-2 * half} ${2 * half}`
    case 'diamond': return `M${round(x)} ${round(y - half)}l${half} ${half}l${-half} ${half}l${-half} ${-half}z`
    case 'triangle': return `M${round(x)} ${round(y - half)}l${half} ${2 * half}h${-2 * half}z`
  }
}

/** A coordinate as a drawing holds it: hundredths of a pixel. */
export const round = (value: number) => Math.round(value * 100) / 100
