import { describe, expect, it } from 'vitest'
import { escapeMarkup, foldOption } from '../../../app/charts/foldOption'
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
  const option = foldOption({ points, series, settings: many.settings, names, palette: light, hint: i => [`feature ${i}`, '<b>'], narrow: false, zoom: null })

  it('leans A to the left and B to the right of an even middle', () => {
    const [ratios] = option.xAxis as { min: number, max: number }[]
    expect(ratios?.min).toBe(-(ratios?.max ?? 0))
    expect(ratios?.max).toBeGreaterThanOrEqual(points.widest)
  })

  it('draws the limits with their values', () => {
    const drawn = JSON.stringify((option.series as { id: string, markLine?: unknown }[]).filter(each => each.id.startsWith('limits')).map(each => each.markLine))
    for (const text of ['×2', 'q 0.05', '×3']) expect(drawn).toContain(`"${text}"`)
  })

  it('escapes what a hint says', () => {
    const { formatter } = option.tooltip as { formatter: (mark: { seriesId: string, dataIndex: number }) => string }
    const [shown] = series
    expect(formatter({ seriesId: String(shown?.option.id), dataIndex: 0 })).toBe(`feature ${shown?.features[0]}<br>&lt;b&gt;`)
    expect(escapeMarkup('<img onerror="x">\'&')).toBe('&lt;img onerror=&quot;x&quot;&gt;&#39;&amp;')
  })

  it('shows the part it is zoomed to', () => {
    const zoomed = foldOption({ points, series, settings: many.settings, names, palette: light, hint: () => [], narrow: false, zoom: { x: [1, 2], y: [3, 4] } })
    expect((zoomed.xAxis as { min: number }[])[0]?.min).toBe(1)
    expect((zoomed.yAxis as { max: number }[])[0]?.max).toBe(4)
  })
})

describe('the fold-change plot in words', () => {
  it('names sides, counts and limits', () => {
    const text = foldText(many.result, points, many.settings, names)
    for (const part of ['Millrace', 'Tallow Lane', '×2', '×3', String(many.result.counts.onlyA)]) expect(text).toContain(part)
  })

  it('says so where precision is assumed', () => {
    const single = judge([onA('M1', [1000]), onB('T1', [4000])])
    expect(foldText(single.result, placeFeatures(single.result.columns), many.settings, names)).toContain('assumed precision of 20 %')
  })
})
