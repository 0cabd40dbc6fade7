import { fonts, light } from '#shared/tokens'
import { textWidth } from '~/charts/drawing'
import { escapeXml } from '~/charts/figure/escapeXml'
import type { CaptionLine } from '~/charts/figure/figureCaption'

/** Pixels around the drawing. */
const LEAST_WIDTH = 560
const MARGIN = 24
const TITLE = 34
const LINE = 17
const TERM = 72
const SIZE = 12

export interface FigureParts {
  title: string
  /** What it shows in words, for who does not see it. */
  description: string
  /** The drawing as SVG markup, its outermost element an svg of this size. */
  drawing: string
  width: number
  height: number
  caption: readonly CaptionLine[]
  /** The text font as data URL; null: fonts of the machine. */
  fontUrl: string | null
}

/** A figure for paper: title, drawing and caption in one SVG that needs nothing else. Its size is in `width` and `height`. */
export function composeFigure({ title, description, drawing, width, height, caption, fontUrl }: FigureParts): { svg: string, width: number, height: number } {
  const across = Math.max(width, LEAST_WIDTH)
  const lines = caption.flatMap(({ term, text }) => wrapText(text, across - TERM, SIZE).map((each, i) => ({ term: i === 0 ? term : '', text: each })))
  const top = MARGIN + TITLE
  const captionTop = top + height + 26
  const whole = { width: across + 2 * MARGIN, height: Math.ceil(captionTop + (lines.length - 1) * LINE + MARGIN) }
  const font = fontUrl ? `@font-face{font-family:"Atkinson Hyperlegible Next Variable";font-weight:200 800;src:url(${fontUrl}) format("woff2")}` : ''
  const svg = [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${whole.width}" height="${whole.height}" viewBox="0 0 ${whole.width} ${whole.height}" role="img" font-family="${escapeXml(fonts.text)}">`,
    `<title>${escapeXml(title)}</title><desc>${escapeXml(description)}</desc>`,
    font ? `<style>${font}</style>` : '',
    `<rect width="100%" height="100%" fill="${light.panel}"/>`,
    `<text x="${MARGIN}" y="${MARGIN + 16}" font-size="18" font-weight="600" fill="${light.ink}">${escapeXml(title)}</text>`,
    drawing.replace(/^\s*<svg /, `<svg x="${MARGIN}" y="${top}" `),
    `<path d="M${MARGIN} ${captionTop - 18}h${across}" stroke="${light.hairline}"/>`,
    ...lines.map(({ term, text }, i) => {
      const y = captionTop + i * LINE
      const name = term ? `<text x="${MARGIN}" y="${y}" font-size="${SIZE}" font-weight="600" fill="${light.muted}">${escapeXml(term)}</text>` : ''
      return `${name}<text x="${MARGIN + TERM}" y="${y}" font-size="${SIZE}" fill="${light.ink}">${escapeXml(text)}</text>`
    }),
    '</svg>',
  ].join('')
  return { svg, ...whole }
}

/** Breaks a text into lines of about a width, between words; a word that is longer than a line is cut. */
export function wrapText(text: string, width: number, size: number): string[] {
  const most = Math.max(8, Math.floor(width / textWidth('x', size)))
  const lines: string[] = []
  let line = ''
  for (const word of text.split(/\s+/).flatMap(each => each.match(new RegExp(`.{1,${most}}`, 'gu')) ?? [])) {
    if (line !== '' && line.length + 1 + word.length > most) {
      lines.push(line)
      line = word
    }
    else {
      line = line === '' ? word : `${line} ${word}`
    }
  }
  return line === '' ? lines : [...lines, line]
}
