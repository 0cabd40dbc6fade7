import { describe, expect, it } from 'vitest'
import { massErrorPpm } from '../../../shared/science/mass/massError'
import { massToleranceDa } from '../../../shared/science/mass/tolerance'

describe('massToleranceDa', () => {
  it('is relative above m/z 200 and its floor below: 5 ppm and 0.001 Da (EU 2021/808)', () => {
    expect(massToleranceDa(400, 5)).toBeCloseTo(0.002, 12)
    expect(massToleranceDa(200, 5)).toBeCloseTo(0.001, 12)
    expect(massToleranceDa(100, 5)).toBeCloseTo(0.001, 12)
    expect(massToleranceDa(100, 10)).toBeCloseTo(0.002, 12)
  })
  it('takes a floor set by hand, 0 too', () => {
    expect(massToleranceDa(100, 5, 0.01)).toBe(0.01)
    expect(massToleranceDa(100, 5, 0)).toBeCloseTo(0.0005, 12)
  })
})

describe('massErrorPpm', () => {
  it('is signed: measured minus theoretical over theoretical (Brenton & Godfrey 2010)', () => {
    expect(massErrorPpm(500.0025, 500)).toBeCloseTo(5, 9)
    expect(massErrorPpm(499.9975, 500)).toBeCloseTo(-5, 9)
  })
})
