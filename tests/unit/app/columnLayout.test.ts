import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ALWAYS_SHOWN, COLUMN_CODES, COLUMN_IDS, DEFAULT_LAYOUT, frozenThatFit, frozenTo, movedTo, readLayout, withColumn, writeLayout, type ColumnLayout } from '../../../app/utils/columnLayout'

const id = fc.constantFrom(...COLUMN_IDS)
const act = fc.oneof(
  fc.tuple(id, fc.boolean()).map(([column, isShown]) => (layout: ColumnLayout) => withColumn(layout, column, isShown)),
  fc.tuple(id, fc.integer({ min: -3, max: 40 })).map(([column, place]) => (layout: ColumnLayout) => movedTo(layout, column, place)),
  fc.option(id, { nil: null }).map(column => (layout: ColumnLayout) => frozenTo(layout, column)),
)

describe('the columns chosen', () => {
  it('stay a layout whatever is done: each column once, the m/z always, no more frozen than there are', () => {
    fc.assert(fc.property(fc.array(act, { maxLength: 20 }), (acts) => {
      const layout = acts.reduce((before, next) => next(before), DEFAULT_LAYOUT)
      expect(new Set(layout.shown).size).toBe(layout.shown.length)
      expect(layout.shown).toContain(ALWAYS_SHOWN)
      expect(layout.frozen).toBeGreaterThanOrEqual(0)
      expect(layout.frozen).toBeLessThanOrEqual(layout.shown.length)
      expect(readLayout(writeLayout(layout))).toEqual(layout)
    }))
  })

  it('have a short name each', () => expect(new Set(Object.values(COLUMN_CODES)).size).toBe(COLUMN_IDS.length))

  it('are read with what is no column left out', () => {
    expect(readLayout('g.zz.z.g~v.t')).toEqual({ shown: ['flags', 'mz', 'verdict', 'minutes'], frozen: 2 })
    expect(readLayout('~v')).toEqual({ shown: ['mz', 'verdict'], frozen: 1 })
    for (const text of ['', 'z', '~', 'a~b~c', 'nothing~']) expect(readLayout(text)).toBeUndefined()
  })

  it('let go of a frozen one when it is put away', () => {
    expect(withColumn(DEFAULT_LAYOUT, 'number', false)).toEqual({ shown: DEFAULT_LAYOUT.shown.filter(each => each !== 'number'), frozen: 2 })
    expect(withColumn(DEFAULT_LAYOUT, 'mz', false)).toEqual(DEFAULT_LAYOUT)
  })

  it('freeze only as many as leave room to scroll', () => {
    expect(frozenThatFit([3, 4, 6, 4], 3, 22, 8)).toBe(3)
    expect(frozenThatFit([3, 4, 6, 4], 4, 22, 8)).toBe(3)
    expect(frozenThatFit([3, 4, 6, 4], 4, 5, 8)).toBe(0)
  })
})
