import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { areaFromDrawing, areaOnDrawing } from '../../../app/charts/areaDrawing'
import { areaNumbers, areaOfNumbers } from '../../../app/charts/areaNumbers'
import { foldFrame, markOf, PANES, paneAt, toPixelX, toPixelY, toValueX, toValueY } from '../../../app/charts/foldFrame'
import { foldMarks } from '../../../app/charts/foldMarks'
import { PLACE, placeFeatures } from '../../../app/charts/foldPoints'
import { scaledWindow, zoomOn } from '../../../app/charts/foldZoom'
import { whiskerOf, whiskerPath, whiskerText } from '../../../app/charts/whisker'
import { judge, onA, onB } from '../../support/comparisonInput'
import { manyVerdicts } from '../../support/manyFeatures'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const many = manyVerdicts(3000)
const { columns } = many.result
const points = placeFeatures(columns)
const rows = Int32Array.from({ length: 3000 }, (_, i) => i)
const frameOf = (width: number, narrow = false, shown: Parameters<typeof foldFrame>[0]['shown'] = null) => foldFrame({ points, settings: many.settings, narrow, width, shown })
const onRatios = points.place.indexOf(PLACE.ratios)

describe('the panes of the fold-change plot', () => {
  it.each([[320, true], [390, true], [640, false], [1440, false]])('lie apart from each other and within %i px', (width, narrow) => {
    const frame = frameOf(width - 60, narrow)
    const boxes = PANES.map(name => frame.panes[name])
    for (const [i, one] of boxes.entries()) {
      expect(one.left).toBeGreaterThanOrEqual(0)
      expect(one.left + one.width).toBeLessThanOrEqual(frame.width)
      expect(one.top + one.height).toBeLessThan(frame.height)
      for (const other of boxes.slice(i + 1)) {
        expect(one.left + one.width <= other.left || other.left + other.width <= one.left || one.top + one.height <= other.top || other.top + other.height <= one.top).toBe(true)
      }
    }
  })

  it('hold every drawn feature when the whole is shown', () => {
    for (const narrow of [false, true]) {
      const frame = frameOf(700, narrow)
      rows.forEach((i) => {
        if (points.place[i] === PLACE.none) return
        const mark = markOf(frame, points, i)
        expect(mark && paneAt(frame, mark.x, mark.y)).toBe(mark?.pane)
      })
    }
  })

  it('turn values to pixels and back', () => {
    fc.assert(fc.property(fc.constantFrom(...PANES), fc.double({ min: -5, max: 5, noNaN: true }), (name, value) => {
      const pane = frameOf(800).panes[name]
      expect(toValueX(pane, toPixelX(pane, value))).toBeCloseTo(value)
      expect(toValueY(pane, toPixelY(pane, value))).toBeCloseTo(value)
    }))
  })
})

describe('a mark under the pointer', () => {
  it('is found where it is drawn, or another at the same place', () => {
    const frame = frameOf(800)
    const marks = foldMarks(frame, points, rows)
    for (const i of rows) {
      const mark = markOf(frame, points, i)
      if (!mark) continue
      const found = markOf(frame, points, marks.nearest(mark.x, mark.y, 3))
      expect(Math.hypot((found?.x ?? 0) - mark.x, (found?.y ?? 0) - mark.y)).toBeLessThan(0.01)
    }
  })

  it('is none beyond the window shown', () => {
    const frame = frameOf(800, false, { x: [90, 91], y: [0, 1] })
    expect(markOf(frame, points, onRatios)).toBeNull()
    expect(foldMarks(frame, points, Int32Array.of(onRatios)).nearest(400, 200, 2000)).toBe(-1)
  })
})

describe('zooming', () => {
  it('goes nearer about the middle, further until the whole is shown', () => {
    const { x, y } = frameOf(800).panes.ratios
    const whole = { x, y }
    const near = scaledWindow(whole, 0.5, whole)
    expect((near?.x[1] ?? 0) - (near?.x[0] ?? 0)).toBeCloseTo((x[1] - x[0]) / 2, 2)
    expect(scaledWindow(near ?? whole, 2.1, whole)).toBeNull()
  })

  it('stays as it is where it would be too near', () => {
    const least = { x: [0, 0.015] as [number, number], y: [0, 0.015] as [number, number] }
    expect(scaledWindow(least, 0.5, { x: [-4, 4], y: [0, 9] })).toEqual(least)
  })

  it('has the feature in the middle, and none for one of a lane', () => {
    const shown = zoomOn(points, onRatios)
    expect(((shown?.x[0] ?? 0) + (shown?.x[1] ?? 0)) / 2).toBeCloseTo(points.x[onRatios] ?? 0)
    expect(zoomOn(points, points.place.indexOf(PLACE.laneA))).toBeNull()
  })
})

describe('the interval of the selected feature', () => {
  it('is a bar from its lower to its upper end, with caps', () => {
    const frame = frameOf(800)
    const whisker = whiskerOf(frame, points, columns, onRatios)
    expect(whisker?.from).toBeCloseTo(toPixelX(frame.panes.ratios, columns.low[onRatios] ?? 0))
    expect(whisker?.to).toBeCloseTo(toPixelX(frame.panes.ratios, columns.high[onRatios] ?? 0))
    expect(whisker && whiskerPath(whisker)).toMatch(/^M[\d.]+ [\d.]+H[\d.]+M.*V.*M.*V/)
  })

  it('is cut at the edge of the plot with an arrow', () => {
    const [x = 0, y = 0] = [points.x[onRatios], points.y[onRatios]]
    const frame = frameOf(800, false, { x: [x - 1e-4, x + 1e-4], y: [y - 1, y + 1] })
    const whisker = whiskerOf(frame, points, columns, onRatios)
    const { left, width } = frame.panes.ratios
    expect(whisker).toMatchObject({ from: left, to: left + width, cutLeft: true, cutRight: true })
    expect(whisker && whiskerPath(whisker)).not.toContain('V')
  })

  it('says where precision is assumed, and is silent where there is none', () => {
    const single = judge([onA('M1', [1000]), onB('T1', [4000])])
    expect(whiskerText(single.result.columns, 0, names)).toMatch(/^The bar is the 95 % interval .*, by assumed precision\.$/)
    expect(whiskerText(columns, onRatios, names)).not.toContain('assumed')
    const inLane = points.place.indexOf(PLACE.laneA)
    expect(whiskerText(columns, inLane, names)).toBe('')
    expect(whiskerOf(frameOf(800), points, columns, inLane)).toBeNull()
  })
})

describe('an area from the drawing', () => {
  it('lies on the drawing where it was drawn', () => {
    const frame = frameOf(800)
    for (const name of PANES) {
      const { left, top } = frame.panes[name]
      const outline = [[left + 5, top + 5], [left + 40, top + 5], [left + 40, top + 60]] as const
      const back = areaOnDrawing(frame, 'certainty', areaFromDrawing(frame.panes[name], name, 'certainty', outline))
      expect(back?.pane).toBe(name)
      outline.forEach(([x, y], at) => {
        expect(back?.corners[at]?.[0]).toBeCloseTo(x, 0)
        expect(back?.corners[at]?.[1]).toBeCloseTo(y, 0)
      })
    }
  })

  it('is not shown where the plot counts upwards by something else', () => {
    expect(areaOnDrawing(frameOf(800), 'abundance', { pane: 'certainty', corners: [[0, 0], [1, 0], [1, 1]] })).toBeNull()
  })
})

describe('an area by numbers', () => {
  it('begins with all that the pane shows, and gives the rectangle of its fields', () => {
    const frame = frameOf(800)
    const { fields } = areaNumbers(frame, null, 'certainty')
    expect(fields.xFrom).toBe(frame.panes.ratios.x[0])
    expect(areaOfNumbers('ratios', 'certainty', { xFrom: 1, xTo: 3, yFrom: 2, yTo: 5 })).toEqual({ pane: 'certainty', corners: [[1, 2], [3, 2], [3, 5], [1, 5]] })
  })

  it('asks in a lane for the reach itself', () => {
    const area = areaOfNumbers('laneA', 'certainty', { xFrom: 100, xTo: 500, yFrom: 3, yTo: 100 })
    expect(area?.corners[0]).toEqual([100, 0.4771])
    expect(areaNumbers(frameOf(800), area, 'certainty')).toEqual({ pane: 'laneA', fields: { xFrom: 100, xTo: 500, yFrom: 3, yTo: 100 } })
    expect(areaOfNumbers('laneA', 'certainty', { xFrom: 100, xTo: 500, yFrom: 0, yTo: 100 })).toBeNull()
    expect(areaOfNumbers('ratios', 'certainty', { xFrom: null, xTo: 3, yFrom: 2, yTo: 5 })).toBeNull()
  })
})
