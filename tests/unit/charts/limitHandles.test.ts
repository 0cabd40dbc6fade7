import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { limitHandles, movedLimit, snapAlpha, snapTimes, steppedLimit, type LimitId } from '../../../app/charts/limitHandles'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'

const names = { a: 'Millrace', b: 'Tallow Lane' }
const ids: LimitId[] = ['foldA', 'foldB', 'alpha', 'reachA', 'reachB']
const handleOf = (id: LimitId, settings = comparisonDefaults) => limitHandles(settings, 'certainty', names).find(each => each.id === id)

describe('the handles of limits', () => {
  it('stand at the limits, with words for each', () => {
    expect(limitHandles(comparisonDefaults, 'certainty', names).map(({ id, at, short }) => [id, Number(at.toFixed(3)), short])).toEqual([
      ['reachA', 0.477, '×3'], ['foldA', -1, '×2'], ['alpha', 1.301, 'q 0.05'], ['foldB', 1, '×2'], ['reachB', 0.477, '×3'],
    ])
    expect(handleOf('foldA')?.says).toBe('×2 more in Millrace')
    expect(handleOf('reachA')?.says).toBe('×3: what stands lower, Tallow Lane could not have shown')
  })

  it('has none for alpha where ratios are not tested', () => {
    expect(limitHandles(comparisonDefaults, 'abundance', names).map(({ id }) => id)).not.toContain('alpha')
  })

  it('moves either fold line: the limit is one for both', () => {
    expect(2 ** (movedLimit('foldA', -2.02).foldLimit ?? 0)).toBeCloseTo(4.1)
    expect(movedLimit('foldB', 2.02)).toEqual(movedLimit('foldA', -2.02))
    expect(movedLimit('alpha', 2.31)).toEqual({ alpha: 0.005 })
    expect(movedLimit('reachB', 1)).toEqual({ reachLimit: 10 })
  })

  it('keeps to the range however far it is dragged, and stays where it is put', () => {
    fc.assert(fc.property(fc.constantFrom(...ids), fc.double({ min: -12, max: 12, noNaN: true }), (id, at) => {
      const settings = { ...comparisonDefaults, ...movedLimit(id, at) }
      const handle = handleOf(id, settings)
      expect(handle?.at).toBeGreaterThanOrEqual((handle?.lowest ?? 0) - 1e-9)
      expect(handle?.at).toBeLessThanOrEqual((handle?.highest ?? 0) + 1e-9)
      expect({ ...settings, ...movedLimit(id, handle?.at ?? 0) }).toEqual(settings)
    }))
  })

  it('steps along its axis, and back to where it was', () => {
    fc.assert(fc.property(fc.constantFrom(...ids), fc.double({ min: -3, max: 3, noNaN: true }), fc.constantFrom(1, -1, 10, -10), (id, at, steps) => {
      const settings = { ...comparisonDefaults, ...movedLimit(id, at) }
      const stepped = { ...settings, ...steppedLimit(id, settings, steps) }
      const [from, to] = [handleOf(id, settings), handleOf(id, stepped)]
      if (from && to) expect(Math.sign(to.at - from.at) === Math.sign(steps) || to.at === from.at).toBe(true)
      const isAtEnd = to === undefined || Math.abs(to.at - to.lowest) < 1e-6 || Math.abs(to.at - to.highest) < 1e-6
      if (!isAtEnd) expect(steppedLimit(id, stepped, -steps)).toEqual(movedLimit(id, from?.at ?? 0))
    }), { numRuns: 500 })
  })
})

describe('sensible digits', () => {
  it.each([[1, 1.1], [2.04, 2], [4.97, 5], [5.3, 5.5], [12.4, 12], [104, 100], [106, 110], [5000, 1000]])('sets ×%d to ×%d', (value, snapped) => {
    expect(snapTimes(value)).toBe(snapped)
  })

  it.each([[0.0512, 0.05], [0.096, 0.1], [0.9, 0.5], [1e-9, 1e-6]])('sets q %d to %d', (value, snapped) => {
    expect(snapAlpha(value)).toBe(snapped)
  })
})
