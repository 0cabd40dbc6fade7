import { describe, expect, it } from 'vitest'
import { sampleDots, sampleDotsText } from '../../../app/charts/sampleDots'
import { displayFactors, sampleValues } from '../../../app/charts/sampleValues'
import { blank, comparisonInput, none, onA, onB } from '../../support/comparisonInput'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const input = comparisonInput([
  onB('T1', [4000, none], { amount: 200 }), onA('M1', [1000, 300]), onA('M2', [none, 320]), blank('blank', [50, none]),
])
const factors = displayFactors(input.samples, { normaliseByAmount: true })
const values = sampleValues(input, factors, { intensityLimit: null }, 0)

describe('values per sample', () => {
  it('stand side by side: A, B, then blanks', () => {
    expect(values.map(({ name }) => name)).toEqual(['M1', 'M2', 'T1', 'blank'])
  })

  it('are normalised on the sides and as injected in blanks; floors likewise', () => {
    expect(values[2]?.value).toBeCloseTo(4000 * (factors[0] ?? 0))
    expect((values[2]?.value ?? 0) / (values[0]?.value ?? 1)).toBeCloseTo(2)
    expect(values[2]?.floor).toBeCloseTo(100 * (factors[0] ?? 0))
    expect(values[3]).toMatchObject({ value: 50, counts: 50 })
  })

  it('know what was not found, and take a floor from the intensity limit where it is higher', () => {
    expect(values[1]?.counts).toBeNaN()
    expect(sampleValues(input, factors, { intensityLimit: 5000 }, 0)[3]?.floor).toBe(5000)
  })
})

describe('the dot plot of a feature', () => {
  const dots = sampleDots(values, names)

  it('has a row a group, all within the drawing, greater values further right', () => {
    expect(dots.rows.map(({ group }) => group)).toEqual(['A', 'B', 'blank'])
    for (const { x, y } of dots.rows.flatMap(row => row.dots)) {
      expect(x).toBeGreaterThanOrEqual(0)
      expect(x).toBeLessThanOrEqual(dots.width)
      expect(y).toBeLessThanOrEqual(dots.height)
    }
    expect(dots.rows[1]?.dots[0]?.x).toBeGreaterThan(dots.rows[0]?.dots[0]?.x ?? Number.NaN)
  })

  it('counts what was not found and draws the floor', () => {
    expect(dots.rows[0]).toMatchObject({ notFound: 1 })
    expect(dots.rows[0]?.floorX).toBeLessThan(dots.rows[0]?.dots[0]?.x ?? 0)
  })

  it('stands where nothing is known at all', () => {
    const bare = comparisonInput([onA('M1', [none], { floor: Number.NaN }), onB('T1', [none], { floor: Number.NaN })])
    const drawn = sampleDots(sampleValues(bare, displayFactors(bare.samples, { normaliseByAmount: true }), { intensityLimit: null }, 0), names)
    expect(drawn.rows.map(({ floorX, notFound }) => [floorX, notFound])).toEqual([[null, 1], [null, 1]])
  })

  it('is told in words', () => {
    expect(sampleDotsText(values, names, String)).toContain('Millrace: found in 1 of 2')
  })
})
