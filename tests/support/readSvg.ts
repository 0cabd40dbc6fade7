import { SaxesParser } from 'saxes'

/** Reads an SVG as strict XML does, or throws: its texts, the names of its elements, and its size. */
export function readSvg(markup: string): { texts: string[], elements: string[], width: number, height: number } {
  const texts: string[] = []
  const elements: string[] = []
  const size = { width: Number.NaN, height: Number.NaN }
  const open: string[] = []
  const parser = new SaxesParser()
  parser.on('error', (error) => {
    throw error
  })
  parser.on('opentag', ({ name, attributes }) => {
    if (elements.length === 0) Object.assign(size, { width: Number(attributes.width), height: Number(attributes.height) })
    elements.push(name)
    open.push(name)
  })
  parser.on('closetag', () => open.pop())
  parser.on('text', (text) => {
    if (['text', 'tspan', 'title', 'desc'].includes(open.at(-1) ?? '') && text.trim() !== '') texts.push(text.trim())
  })
  parser.write(markup).close()
  return { texts, elements, ...size }
}
