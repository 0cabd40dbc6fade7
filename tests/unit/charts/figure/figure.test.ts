import { describe, expect, it } from 'vitest'
import { beamFigure } from '../../../../app/charts/beamFigure'
import type { Drawing } from '../../../../app/charts/drawing'
import { benchFigures, filterLine } from '../../../../app/charts/figure/benchFigures'
import { composeFigure, wrapText } from '../../../../app/charts/figure/composeFigure'
import { drawFigure } from '../../../../app/charts/figure/drawFigure'
import { drawingToSvg } from '../../../../app/charts/figure/drawingToSvg'
import { escapeXml } from '../../../../app/charts/figure/escapeXml'
import { figureFileName, type FigureContext } from '../../../../app/charts/figure/figure'
import { axisNames, figureCaption } from '../../../../app/charts/figure/figureCaption'
import { dotsDrawing, sampleDots } from '../../../../app/charts/sampleDots'
import { displayFactors, sampleValues } from '../../../../app/charts/sampleValues'
import { filterWords } from '../../../../app/utils/filterWords'
import { initialView } from '../../../../app/utils/benchView'
import { comparisonDefaults } from '../../../../shared/science/verdict/settings'
import { fonts, light } from '../../../../shared/tokens'
import { readSvg } from '../../../support/readSvg'
import { comparisonInput, none, onA, onB } from '../../../support/comparisonInput'

const date = new Date('2026-12-01T12:00:00Z')
const attack = '<script>alert(1)</script> & "Söhne" \u0000]]>'
const context: FigureContext = {
  file: ['Press & carton', 'v2'], sides: ['A Millrace: 3 preparations (M1, M2, M3)', `B ${attack}`], settings: ['Reach limit: ×3', 'Amount step: on'],
  filter: '12 of 803 features: flagged', origin: 'Apple juices; “Press & carton”; version 2', engineVersion: '4', cautions: ['Screening indication only.'],
}
const drawing: Drawing = { width: 300, height: 80, shapes: [{ kind: 'text', x: 1, y: 20, text: attack, ink: 'sideA', says: attack }, { kind: 'mark', shape: 'circle', x: 5, y: 5, ink: 'sideB', says: 'T1' }, { kind: 'line', d: 'M0 0L5 5', ink: 'muted' }] }

describe('the caption of a figure', () => {
  it('says axes, sides, settings, filter, origin, engine, date and caution', () => {
    const caption = figureCaption({ settings: ['Intensity as injected'], isFiltered: true }, context, ['across: log2 ratio'], date)
    expect(caption.map(({ term }) => term)).toEqual(['Axes', 'Sides', '', 'Settings', 'Filter', 'From', 'Caution'])
    expect(caption.find(({ term }) => term === 'Settings')?.text).toBe('Intensity as injected; Reach limit: ×3; Amount step: on')
    expect(caption.find(({ term }) => term === 'From')?.text).toBe('Apple juices; “Press & carton”; version 2; engine 4; drawn 2026-12-01')
  })

  it('leaves the filter out where the plot does not follow it', () => {
    expect(figureCaption({}, context, [], date).map(({ term }) => term)).toEqual(['Sides', '', 'Settings', 'From', 'Caution'])
  })

  it('takes the names of axes from an option, each once', () => {
    expect(axisNames({ xAxis: [{ name: 'log2 ratio' }, { name: 'log2 ratio' }, {}], yAxis: { name: 'certainty, −log10 q' } })).toEqual(['across: log2 ratio', 'up: certainty, −log10 q'])
    expect(axisNames({})).toEqual([])
  })

  it('breaks lines between words, and words that are too long', () => {
    const lines = wrapText(`${'word '.repeat(40)}${'x'.repeat(300)}`, 300, 12)
    expect(lines.every(line => line.length <= 44)).toBe(true)
    expect(lines.join('').replaceAll(' ', '')).toBe('word'.repeat(40) + 'x'.repeat(300))
    expect(wrapText('', 300, 12)).toEqual([])
  })
})

describe('a figure as SVG', () => {
  it('holds what people typed as text, never as markup', () => {
    const { svg } = composeFigure({ title: attack, description: attack, drawing: drawingToSvg(drawing, light), width: 300, height: 80, caption: figureCaption({}, context, [], date), fontUrl: null })
    const { texts, elements } = readSvg(svg)
    expect(elements).not.toContain('script')
    expect(svg).not.toContain('\u0000')
    expect(texts).toEqual(expect.arrayContaining(['<script>alert(1)</script> & "Söhne" ]]>']))
    expect(texts.join(' ')).toContain('B <script>alert(1)</script> & "Söhne"')
  })

  it('leaves out signs that XML forbids, and halves of signs', () => {
    expect(escapeXml('a\u0000b\uD800c\u000B')).toBe('ab\uFFFDc')
  })

  it('is as wide as its drawing and its margins, and says its size', () => {
    const figure = composeFigure({ title: 'x', description: '', drawing: drawingToSvg({ ...drawing, width: 960 }, light), width: 960, height: 80, caption: [], fontUrl: null })
    expect(figure.width).toBe(1008)
    expect(figure.svg).toContain(`width="1008" height="${figure.height}"`)
  })

  it('carries its font, where there is one', () => {
    const parts = { title: 'x', description: '', drawing: '<svg width="1"></svg>', width: 300, height: 80, caption: [] }
    expect(composeFigure({ ...parts, fontUrl: 'data:font/woff2;base64,AAAA' }).svg).toContain('src:url(data:font/woff2;base64,AAAA)')
    expect(composeFigure({ ...parts, fontUrl: null }).svg).not.toContain('@font-face')
  })

  it('draws an option by its own functions, axes named, names escaped, every point there', () => {
    const count = 5000
    const data = Float64Array.from({ length: 2 * count }, (_, i) => i % 97)
    const { svg } = drawFigure({
      name: 'fold change', isFiltered: true,
      option: palette => ({
        textStyle: { fontFamily: fonts.text },
        xAxis: { name: `log2 ratio, ${attack} over A`, type: 'value', nameTextStyle: { fontFamily: fonts.text } }, yAxis: { name: 'certainty, −log10 q', type: 'value' },
        series: [{ type: 'scatter', data, dimensions: ['x', 'y'], large: true, largeThreshold: 0, progressive: 0, symbol: 'rect', itemStyle: { color: palette.sideA } }],
      }),
    }, { title: 'Fold change', description: '', context, date, fontUrl: null })
    const { texts, elements } = readSvg(svg)
    expect(elements).not.toContain('script')
    expect(texts).toEqual(expect.arrayContaining(['certainty, −log10 q', 'Reach limit: ×3; Amount step: on']))
    expect(texts.join('\n')).toContain('12 of 803 features: flagged')
    expect(svg.match(/M[\d.]+ [\d.]+/g)?.length).toBeGreaterThanOrEqual(count)
    expect(svg).toContain(light.sideA)
  })

  it('draws beam and dots of the card', () => {
    const counts = { inNeither: 0, onlyA: 41, onlyB: 12, moreA: 3, moreB: 98, level: 1803, unsettled: 4, setAside: 5 }
    const beam = readSvg(drawingToSvg(beamFigure(counts, { a: attack, b: 'Tallow Lane' }, 960), light))
    expect(beam.texts.join(' ')).toContain('found only here 41, more here 3')
    const data = comparisonInput([onA('M1', [1000]), onB('T1', [none])])
    const dots = sampleDots(sampleValues(data, displayFactors(data.samples, comparisonDefaults), comparisonDefaults, 0), { a: 'Millrace', b: attack })
    expect(readSvg(drawingToSvg(dotsDrawing(dots), light)).texts).toContain('1 not')
  })
})

describe('the file of a figure', () => {
  it('says plot, comparison and version, in letters, digits and hyphens alone', () => {
    expect(figureFileName('fold change', context, 'svg')).toBe('fold-change_press-carton_v2.svg')
    expect(figureFileName('fold change', { ...context, file: ['../../Äpfel: "süß"? ', 'v1'] }, 'png')).toBe('fold-change_äpfel-süß_v1.png')
    expect(figureFileName('x', { ...context, file: ['сок', 'v1'] }, 'png')).toBe('x_сок_v1.png')
  })
})

describe('what stands under the figures of a bench', () => {
  const { samples } = comparisonInput([onA('M1', [1]), onA('M2', [1]), onB('T1', [1])])
  const source = { title: 'Press and carton', study: 'Apple juices', version: { number: 2, sideAName: 'Millrace', sideBName: 'Tallow Lane', counts: beamCounts(), settings: comparisonDefaults, samples: samples.map(sample => ({ ...sample })), cautions: ['Few replicates.'], engineVersion: '4', polarity: 'negative' as const, massKind: 'mz' as const, alignMassPpm: 10, createdAt: '2026-12-01T12:00:00.000Z' } }

  it('names sides with their preparations, limits, normalisation and cautions', () => {
    const under = benchFigures(source, comparisonDefaults, 'none', false)
    expect(under.sides).toEqual(['A Millrace: 2 preparations, 100 mg (M1, M2)', 'B Tallow Lane: 1 preparation, 100 mg (T1)'])
    expect(under.settings).toEqual(expect.arrayContaining(['Mass tolerance between tables and of traces: 10 ppm', 'Amount step: on', 'Reach limit: ×3', 'Fold limit: ×2']))
    expect(under.cautions[0]).toContain('Screening')
    expect(under.origin).toBe('Apple juices; “Press and carton”; version 2')
  })

  it('says what is not saved, and nothing of a study that the reader may not know', () => {
    const under = benchFigures({ ...source, study: null }, comparisonDefaults, 'none', true)
    expect(under.origin).toBe('“Press and carton”; version 2, previewed under other limits, not saved')
    expect(under.file).toEqual(['Press and carton', 'v2 preview'])
  })

  it('tells the filter in words, and where there is none', () => {
    expect(filterLine(filterWords(initialView(), 1, { a: 'Millrace', b: 'Tallow Lane' }), 803, 803)).toBe('none, all 803 compared features')
    const view = { ...initialView(), verdicts: ['onlyA' as const, 'moreB' as const], flags: 'flagged' as const }
    expect(filterLine(filterWords(view, 1, { a: 'Millrace', b: 'Tallow Lane' }), 12, 1803)).toBe('12 of 1\u202F803 features: found only in Millrace; more in Tallow Lane; with a flag')
  })
})

function beamCounts() {
  return { inNeither: 0, onlyA: 0, onlyB: 0, moreA: 0, moreB: 0, level: 0, unsettled: 0, setAside: 0 }
}
