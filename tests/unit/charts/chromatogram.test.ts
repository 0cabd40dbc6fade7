import type { LineSeriesOption, ScatterSeriesOption } from 'echarts/charts'
import { describe, expect, it } from 'vitest'
import { scaledCurves, type SampleLine } from '../../../app/charts/chromatogramCurves'
import { chromatogramOption, type ChromatogramInput } from '../../../app/charts/chromatogramOption'
import { chromatogramText, chromatogramTitle, highestPoints } from '../../../app/charts/chromatogramText'
import { plotFrame } from '../../../app/charts/chromatogramWindow'
import { light } from '../../../shared/tokens'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const minutes = Float64Array.from({ length: 2001 }, (_, i) => i / 100)
const peak = (top: number, height: number) => minutes.map(time => height * Math.exp(-(((time - top) / 0.05) ** 2)))
const line = (side: 'A' | 'B', sampleName: string, values: Float64Array, feature: number | null = null): SampleLine => ({ side, sampleName, factor: 1, feature, minutes, values })
const lines = [line('A', 'M1', peak(5, 1000)), line('A', 'M2', peak(5, 800)), line('B', 'T1', peak(12, 400))]
const input: ChromatogramInput = {
  curves: scaledCurves(lines, 'normalised'), looked: [], marks: [], window: [0, 20], scale: 'normalised', byAmount: true,
  divertWindows: [{ startMinutes: 0, endMinutes: 0.8 }], names, palette: light, width: 800, height: 340, narrow: false,
}
const seriesOf = (changes: Partial<ChromatogramInput> = {}) => chromatogramOption({ ...input, ...changes }).series as (LineSeriesOption | ScatterSeriesOption)[]
const dataOf = (series: LineSeriesOption | ScatterSeriesOption | undefined) => Array.from(series?.data as unknown as Float64Array)
const valuesOf = (series: LineSeriesOption | ScatterSeriesOption | undefined) => dataOf(series).filter((_, i) => i % 2 === 1)

describe('the mirrored chromatogram', () => {
  it('draws side A up and side B down, samples thin and means strong on top', () => {
    const [first, second, third, meanA, meanB] = seriesOf() as LineSeriesOption[]
    expect(Math.max(...valuesOf(first))).toBeCloseTo(1000, 6)
    expect(Math.min(...valuesOf(third))).toBeCloseTo(-400, 6)
    expect(Math.max(...valuesOf(third))).toBeLessThanOrEqual(0)
    expect(Math.max(...valuesOf(meanA))).toBeCloseTo(900, 6)
    expect([first, second, third].map(each => each?.lineStyle?.width)).toEqual([1, 1, 1])
    expect([meanA, meanB].map(each => each?.lineStyle?.width)).toEqual([2, 2])
    expect([first, third].map(each => each?.lineStyle?.color)).toEqual([light.sideA, light.sideB])
  })

  it('gives both sides the same height, with room above the highest peak', () => {
    const { yAxis } = chromatogramOption(input)
    expect(yAxis).toMatchObject({ min: -1200, max: 1200, interval: 200 })
    expect(chromatogramOption({ ...input, window: [10, 14] }).yAxis).toMatchObject({ min: -500, interval: 100 })
  })

  it('stands exactly in the frame that the brush over it goes by', () => {
    for (const narrow of [false, true]) expect(chromatogramOption({ ...input, narrow }).grid).toMatchObject({ ...plotFrame(narrow), outerBoundsMode: 'none' })
  })

  it('draws few points of many and loses no top, at each zoom', () => {
    const many = Float64Array.from({ length: 100_000 }, (_, i) => i / 5000)
    const noise = many.map((_, i) => (i * 7919) % 1000)
    noise[43_210] = 5000
    const curves = scaledCurves([{ ...line('A', 'M1', noise), minutes: many }], 'normalised')
    for (const window of [[0, 20], [8, 9], [8.64, 8.645]] as const) {
      const [drawn] = seriesOf({ curves, window })
      expect(Math.max(...valuesOf(drawn))).toBe(5000)
      expect(dataOf(drawn).length / 2).toBeLessThanOrEqual(4 * 800)
    }
  })

  it('tells features apart by the dashes of their means', () => {
    const curves = scaledCurves([7, 3].flatMap(feature => [line('A', 'M1', peak(5, 10), feature), line('B', 'T1', peak(5, 10), feature)]), 'normalised')
    const means = (seriesOf({ curves, looked: [7, 3] }) as LineSeriesOption[]).filter(({ name }) => String(name).startsWith('mean'))
    expect(means.map(({ lineStyle }) => lineStyle?.type)).toEqual(['solid', 'solid', [7, 3], [7, 3]])
  })

  it('shades what is sent to waste, as far as it is shown', () => {
    const shadedIn = (window: readonly [number, number]) => (seriesOf({ window }).find(({ id }) => id === 'middle') as LineSeriesOption).markArea?.data
    expect(shadedIn([0, 20])).toEqual([[{ xAxis: 0, name: 'to waste' }, { xAxis: 0.8 }]])
    expect(shadedIn([0.5, 20])).toEqual([[{ xAxis: 0.5, name: 'to waste' }, { xAxis: 0.8 }]])
    expect(shadedIn([1, 20])).toEqual([])
  })

  it('names no share beyond 100 % where each line goes to its own highest', () => {
    const { yAxis } = chromatogramOption({ ...input, scale: 'own', curves: scaledCurves(lines, 'own') })
    const { max, axisLabel: { formatter } } = yAxis as { max: number, axisLabel: { formatter: (value: number) => string } }
    expect(max).toBeGreaterThan(100)
    expect([-max, -100, 0, 60, 100, max].map(formatter)).toEqual(['', '100 %', '0 %', '60 %', '100 %', ''])
  })

  it('labels what is looked at and flagged by m/z, on its side', () => {
    const mark = { feature: 1, side: 'B' as const, minutes: 12, height: 400, why: 'selected' as const, text: '353.0878' }
    const [label] = (seriesOf({ marks: [mark] }).find(({ id }) => id === 'marks')?.data ?? []) as { value: number[], label: { formatter: string, position: string } }[]
    expect(label).toMatchObject({ value: [12, -400], label: { formatter: '353.0878', position: 'bottom' } })
  })

  it('stands with nothing to draw', () => {
    const { yAxis, series } = chromatogramOption({ ...input, curves: [] })
    expect(yAxis).toMatchObject({ min: -1, max: 1 })
    expect(series).toHaveLength(4)
  })
})

describe('the mirrored chromatogram in words', () => {
  const text = { curves: input.curves, window: [0, 20] as const, kind: 'base' as const, origin: 'features' as const, hasTraces: false, scale: 'normalised' as const, byAmount: true, names, withoutTrace: [], featureName: (feature: number) => `m/z ${feature}` }

  it('says in title and text that it is drawn from features', () => {
    expect(chromatogramTitle('base', 'features')).toBe('Mirrored chromatogram: base peak (BPC), drawn from features')
    expect(chromatogramTitle('total', 'measured')).toBe('Mirrored chromatogram: total (TIC)')
    expect(chromatogramText(text)).toContain('No raw data: the highest of the features as peaks 0.1 min wide')
    expect(chromatogramText({ ...text, origin: 'measured' })).not.toContain('features')
    expect(chromatogramText({ ...text, hasTraces: true, kind: 'extracted' })).toContain('Not the raw data: each feature as a peak 0.1 min wide')
  })

  it('tells sides, scale and the highest point of each mean', () => {
    expect(chromatogramText({ ...text, origin: 'measured' })).toBe('Up Millrace (2 samples), down Tallow Lane (1 sample): each sample a thin line, the mean of the side a strong one. Normalised as the comparison. Highest from 0.00 to 20.00 min: the mean of Millrace at 5.00 min (900); the mean of Tallow Lane at 12.00 min (400).')
  })

  it('says what is missing and where nothing stands', () => {
    const said = chromatogramText({ ...text, origin: 'measured', window: [14, 16], withoutTrace: ['T2'] })
    expect(said).toContain('Without a trace: T2.')
    expect(chromatogramText({ ...text, curves: scaledCurves([line('A', 'M1', new Float64Array(2001))], 'own'), scale: 'own' })).toContain('nothing of the mean of Millrace')
  })

  it('warns of noise where each goes to its own highest', () => {
    expect(chromatogramText({ ...text, scale: 'own' })).toContain('even noise can look like a peak')
  })

  it('gives the highest point of each line within the window, means first', () => {
    expect(highestPoints(input.curves, [4, 6]).map(({ side, sampleName, minutes: at, value }) => [side, sampleName, at, Math.round(value)])).toEqual([
      ['A', null, 5, 900], ['B', null, expect.any(Number), 0], ['A', 'M1', 5, 1000], ['A', 'M2', 5, 800], ['B', 'T1', expect.any(Number), 0],
    ])
  })
})
