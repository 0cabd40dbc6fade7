import { describe, expect, it } from 'vitest'
import { foldFrame } from '../../../app/charts/foldFrame'
import { foldOption } from '../../../app/charts/foldOption'
import { MOST_CERTAIN, PLACE, placeFeatures } from '../../../app/charts/foldPoints'
import { flaggedSeries, foldSeries } from '../../../app/charts/foldSeries'
import { foldText } from '../../../app/charts/foldText'
import { VERDICT } from '../../../shared/science/verdict/verdicts'
import { dark, light } from '../../../shared/tokens'
import { blank, judge, none, onA, onB } from '../../support/comparisonInput'
import { manyVerdicts } from '../../support/manyFeatures'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const many = manyVerdicts(3000)
const points = placeFeatures(many.result.columns)
const rows = Int32Array.from({ length: 3000 }, (_, i) => i)
const series = foldSeries(points, many.result.columns.verdict, rows, light)

describe('places on the fold-change plot', () => {
  it('puts one-sided features at their reach, in the lane of the side that shows them', () => {
    const { result } = judge([onA('M1', [5000, none]), onA('M2', [5200, none]), onB('T1', [none, 900]), onB('T2', [none, 950])])
    const placed = placeFeatures(result.columns)
    expect([...placed.place]).toEqual([PLACE.laneA, PLACE.laneB])
    expect(10 ** placed.y[0]!).toBeCloseTo(result.columns.reach[0]!)
    expect(10 ** placed.y[1]!).toBeCloseTo(result.columns.reach[1]!)
  })

  it('puts what is not above blank on one side into the lane of the other', () => {
    const { result } = judge([onA('M1', [5000]), onA('M2', [5100]), onB('T1', [1000]), onB('T2', [1010]), blank('blank', [900])])
    expect(result.columns.notAboveBlank[0]).toBe(2)
    expect(placeFeatures(result.columns).place[0]).toBe(PLACE.laneA)
  })

  it('counts upwards by certainty with replicates, by abundance without', () => {
    expect(points.kind).toBe('certainty')
    const single = judge([onA('M1', [1000, 200]), onB('T1', [4000, 210])])
    const placed = placeFeatures(single.result.columns)
    expect(placed.kind).toBe('abundance')
    expect(placed.x[0]).toBeCloseTo(2)
    expect(placed.y[0]).toBeCloseTo(Math.log10(2000))
  })

  it('has nothing infinite, and every compared feature is drawn or counted as not drawn', () => {
    const compared = 3000 - many.result.counts.inNeither
    let drawn = 0
    points.place.forEach((place, i) => {
      if (place === PLACE.none) return
      drawn++
      expect(Number.isFinite(points.x[i]) && Number.isFinite(points.y[i])).toBe(true)
      if (place === PLACE.ratios) expect(points.y[i]).toBeLessThanOrEqual(MOST_CERTAIN)
    })
    expect(drawn + points.notDrawn).toBe(compared)
  })
})

describe('series of the fold-change plot', () => {
  it('draws each feature in the series of its verdict', () => {
    const onPlot = series.filter(each => String(each.option.id).endsWith('-0'))
    expect(onPlot.reduce((sum, each) => sum + each.features.length, 0)).toBe([...points.place].filter(place => place !== PLACE.none).length)
    for (const { option, features } of series) {
      for (const feature of features) expect(VERDICT[option.name as keyof typeof VERDICT]).toBe(many.result.columns.verdict[feature])
    }
  })

  it('draws only the rows that pass the filter', () => {
    const few = foldSeries(points, many.result.columns.verdict, rows.slice(0, 10), light)
    expect(Math.max(...few.flatMap(each => [...each.features]))).toBeLessThan(10)
  })

  it('has a shape of its own for A, B, level, unsettled and set aside, in the colours of the scheme', () => {
    const look = (id: string) => series.find(each => each.option.id === id)?.option
    expect(look('moreA-0-0')).toMatchObject({ symbol: 'circle', itemStyle: { color: light.sideA } })
    expect(look('moreB-0-0')).toMatchObject({ symbol: 'rect', itemStyle: { color: light.sideB } })
    expect(look('level-0-0')).toMatchObject({ symbolSize: [7, 2] })
    expect(look('unsettled-0-0')).toMatchObject({ itemStyle: { color: 'transparent', borderColor: light.unsettled } })
    expect(look('setAside-0-1')).toMatchObject({ symbolSize: [5, 1.2] })
    expect(foldSeries(points, many.result.columns.verdict, rows, dark)[0]?.option.itemStyle).toMatchObject({ color: dark.aside })
  })

  it('rings flagged features once more', () => {
    const [first] = series[0]?.features ?? []
    const ringed = flaggedSeries(points, many.result.columns.verdict, [first ?? 0], light)
    expect(ringed.flatMap(each => [...each.features])).toEqual([first])
  })
})

describe('option of the fold-change plot', () => {
  const optionOf = (shown: Parameters<typeof foldFrame>[0]['shown'] = null, limitLabels = true) => {
    const frame = foldFrame({ points, settings: many.settings, narrow: false, width: 900, shown })
    return foldOption({ points, frame, series, settings: many.settings, names, palette: light, limitLabels })
  }
  const option = optionOf()
  const drawn = (of: typeof option) => of.series as { id: string, silent?: boolean, markLine?: { data: { label: { show: boolean, formatter: string } }[] } }[]

  it('leans A to the left and B to the right of an even middle', () => {
    const [ratios] = option.xAxis as { min: number, max: number }[]
    expect(ratios?.min).toBe(-(ratios?.max ?? 0))
    expect(ratios?.max).toBeGreaterThanOrEqual(points.widest)
  })

  it('has both lanes over the same m/z, so that they can be compared', () => {
    const [, laneA, laneB] = option.xAxis as { min: number, max: number }[]
    expect([laneA?.min, laneA?.max]).toEqual([laneB?.min, laneB?.max])
    expect(laneA?.min).toBeLessThanOrEqual(points.lowestMz)
    expect(laneA?.max).toBeGreaterThanOrEqual(points.highestMz)
  })

  it('draws the limits with their values, or without where handles say them', () => {
    const labels = (of: typeof option) => drawn(of).flatMap(({ markLine }) => markLine?.data.flatMap(({ label }) => label.show ? [label.formatter] : []) ?? [])
    expect(labels(option)).toEqual(['×2', '×2', 'q 0.05', '×3', '×3'])
    expect(labels(optionOf(null, false))).toEqual([])
  })

  it('has no mark that answers the pointer, which would search through all', () => {
    expect(drawn(option).every(({ silent }) => silent)).toBe(true)
    expect(option.tooltip).toBeUndefined()
  })

  it('shows the part it is zoomed to', () => {
    const zoomed = optionOf({ x: [1, 2], y: [3, 4] })
    expect((zoomed.xAxis as { min: number }[])[0]?.min).toBe(1)
    expect((zoomed.yAxis as { max: number }[])[0]?.max).toBe(4)
  })
})

describe('the fold-change plot in words', () => {
  it('names sides, counts and limits', () => {
    const text = foldText(many.result, points, many.settings, names)
    for (const part of ['Millrace', 'Tallow Lane', '×2', '×3', String(many.result.counts.onlyA)]) expect(text).toContain(part)
  })

  it('says how many pass the filter, as the counts are of all', () => {
    const all = Object.values(many.result.counts).reduce((sum, count) => sum + count, 0) - many.result.counts.inNeither
    const told = (drawn: number) => foldText(many.result, points, many.settings, names, drawn)
    expect(told(12)).toContain('Only the 12 of ')
    expect(told(0)).toContain('No feature passes the filter: none is drawn. The counts are of all.')
    expect(told(all)).toBe(foldText(many.result, points, many.settings, names))
  })

  it('says so where precision is assumed', () => {
    const single = judge([onA('M1', [1000]), onB('T1', [4000])])
    expect(foldText(single.result, placeFeatures(single.result.columns), many.settings, names)).toContain('assumed precision of 20 %')
  })
})
