import { describe, expect, it } from 'vitest'
import { drawnSamples, highestOf, linesFromFeatures, runOf, scaledCurves, type SampleLine } from '../../../app/charts/chromatogramCurves'
import { peakMarks } from '../../../app/charts/chromatogramMarks'

const line = (side: 'A' | 'B', sampleName: string, values: number[], rest: Partial<SampleLine> = {}): SampleLine =>
  ({ side, sampleName, factor: 1, feature: null, minutes: Float64Array.from(values, (_, i) => i), values: Float64Array.from(values), ...rest })

describe('the samples drawn', () => {
  it('are those compared, with their place and factor', () => {
    const samples = [{ name: 'M1', side: 'A' as const }, { name: 'blank', side: null }, { name: 'T1', side: 'B' as const }, { name: 'T2', side: 'B' as const }]
    expect(drawnSamples(samples, Float64Array.of(2, Number.NaN, 0.5, Number.NaN))).toEqual([
      { position: 0, side: 'A', sampleName: 'M1', factor: 2 }, { position: 2, side: 'B', sampleName: 'T1', factor: 0.5 },
    ])
  })
})

describe('lines drawn from features', () => {
  const data = { retentionMinutes: Float64Array.of(2, 4, 4.02), intensity: [Float64Array.of(100, 300, 200), Float64Array.of(Number.NaN, 50, Number.NaN)] }
  const sample = (position: number) => ({ position, side: 'A' as const, sampleName: `M${position}`, factor: 1 })

  it('add up in a total and stand alone in a base peak', () => {
    const [total] = linesFromFeatures(sample(0), data, 'total', [])
    const [base] = linesFromFeatures(sample(0), data, 'base', [])
    expect(highestOf(base?.values ?? new Float64Array(0)) / 300).toBeCloseTo(1, 2)
    expect(highestOf(total?.values ?? new Float64Array(0))).toBeGreaterThan(450)
  })

  it('are one a feature where features are extracted, flat where it was not detected', () => {
    const lines = linesFromFeatures(sample(1), data, 'extracted', [1, 0])
    expect(lines.map(({ feature }) => feature)).toEqual([1, 0])
    expect(highestOf(lines[0]?.values ?? new Float64Array(0)) / 50).toBeCloseTo(1, 2)
    expect(highestOf(lines[1]?.values ?? new Float64Array(1))).toBe(0)
  })

  it('are none without the sample or without features', () => {
    expect(linesFromFeatures(sample(7), data, 'base', [])).toEqual([])
    expect(linesFromFeatures(sample(0), data, 'extracted', [])).toEqual([])
  })
})

describe('scaled curves', () => {
  it('are normalised by the factor of the sample, the mean after', () => {
    const curves = scaledCurves([line('A', 'M1', [0, 10], { factor: 2 }), line('A', 'M2', [0, 10]), line('B', 'T1', [4, 0])], 'normalised')
    expect(curves.map(({ side, sampleName, values }) => [side, sampleName, [...values]])).toEqual([
      ['A', 'M1', [0, 20]], ['A', 'M2', [0, 10]], ['B', 'T1', [4, 0]], ['A', null, [0, 15]], ['B', null, [4, 0]],
    ])
  })

  it('reach 100 % each where each goes to its own highest, a flat one stays flat', () => {
    const curves = scaledCurves([line('A', 'M1', [0, 8]), line('A', 'M2', [2, 1]), line('B', 'T1', [0, 0])], 'own')
    expect(curves.filter(({ sampleName }) => sampleName !== null).map(({ values }) => Math.max(...values))).toEqual([100, 100, 0])
  })

  it('have a mean a side and feature', () => {
    const curves = scaledCurves([4, 9].flatMap(feature => [line('A', 'M1', [1], { feature }), line('B', 'T1', [1], { feature })]), 'normalised')
    expect(curves.filter(({ sampleName }) => sampleName === null).map(({ side, feature }) => `${side}${feature}`)).toEqual(['A4', 'B4', 'A9', 'B9'])
  })

  it('are none without lines; the run then is not known', () => {
    expect(scaledCurves([], 'own')).toEqual([])
    expect(runOf([])).toBeNull()
    expect(runOf([line('A', 'M1', []), line('A', 'M2', [1, 1, 1])])).toEqual([0, 2])
  })
})

describe('marks of peaks', () => {
  const features = { mz: Float64Array.of(100, 200, 300), retentionMinutes: Float64Array.of(1, 3, 3), levelA: Float64Array.of(5, 2, 7), levelB: Float64Array.of(1, 9, Number.NaN), selected: 1, picked: [2], flagged: [0, 1] }
  const curves = scaledCurves([line('A', 'M1', [0, 5, 0, 2, 0]), line('B', 'T1', [0, 1, 0, 9, 0])], 'normalised')

  it('stand on the side that holds more of the feature, though the other line is higher there; looked at goes before flagged', () => {
    expect(peakMarks(curves, features, String)).toEqual([
      { feature: 0, side: 'A', minutes: 1, height: 5, why: 'flagged', text: '100' },
      { feature: 1, side: 'B', minutes: 3, height: 9, why: 'selected', text: '200' },
      { feature: 2, side: 'A', minutes: 3, height: 2, why: 'picked', text: '300' },
    ])
  })

  it('stand on their own trace and no other where traces are extracted', () => {
    const own = scaledCurves([line('A', 'M1', [0, 0, 0, 7, 0], { feature: 2 })], 'normalised')
    expect(peakMarks(own, features, String)).toEqual([{ feature: 2, side: 'A', minutes: 3, height: 7, why: 'picked', text: '300' }])
  })
})
