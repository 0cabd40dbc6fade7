import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { AREA_PANES, MOST_CORNERS } from '../../../app/utils/plotArea'
import { ABUNDANCE_LAYOUTS, initialView, PLOTS, queryToView, SIGNALS, stepsOf, viewFields, viewToQuery, type BenchView } from '../../../app/utils/benchView'
import { SORT_KEYS } from '../../../app/utils/featureOrder'
import { flagKinds } from '../../../shared/schemas/flag'
import { COUNTED_VERDICTS } from '../../../shared/science/verdict/verdicts'

const decimals = (places: number, largest: number) => fc.integer({ min: -largest * 10 ** places, max: largest * 10 ** places }).map(value => value / 10 ** places)
const ends = fc.tuple(decimals(3, 400), fc.integer({ min: 20, max: 400_000 })).map(([low, by]): [number, number] => [low, Number((low + by / 1000).toFixed(3))])
const view: fc.Arbitrary<BenchView> = fc.record({
  selected: fc.option(fc.nat(999_999), { nil: null }),
  picked: fc.uniqueArray(fc.nat(999_999), { maxLength: 100 }).map(all => all.sort((a, b) => a - b)),
  verdicts: fc.subarray([...COUNTED_VERDICTS]),
  flags: fc.constantFrom('all' as const, 'flagged' as const, ...flagKinds),
  find: fc.string({ maxLength: 40 }),
  massPpm: fc.integer({ min: 1, max: 100 }),
  sort: fc.record({ key: fc.constantFrom(...SORT_KEYS), descending: fc.boolean() }),
  abundanceLayout: fc.constantFrom(...ABUNDANCE_LAYOUTS),
  signal: fc.constantFrom(...SIGNALS),
  plot: fc.constantFrom(...PLOTS),
  area: fc.option(fc.record({ pane: fc.constantFrom(...AREA_PANES), corners: fc.array(fc.tuple(decimals(4, 2000), decimals(4, 2000)), { minLength: 3, maxLength: MOST_CORNERS }) }), { nil: null }),
  foldWindow: fc.option(fc.record({ x: ends, y: ends }), { nil: null }),
  closeUp: fc.boolean(),
})

describe('the address of the bench', () => {
  it('gives back every view', () => {
    fc.assert(fc.property(view, (each) => {
      expect(queryToView(viewToQuery(each))).toEqual(each)
    }))
  })

  it('is empty for the view as it opens', () => {
    expect(Object.values(viewToQuery(initialView())).filter(Boolean)).toEqual([])
  })

  it('takes any query without harm', () => {
    fc.assert(fc.property(fc.dictionary(fc.constantFrom(...Object.values(viewFields).map(({ key }) => key)), fc.oneof(fc.string(), fc.constant(null), fc.array(fc.string()))), (query) => {
      const read = queryToView(query)
      expect(SORT_KEYS).toContain(read.sort.key)
      expect(read.massPpm).toBeGreaterThan(0)
      expect(queryToView(viewToQuery(read))).toEqual(read)
    }))
  })

  it('counts filters, order and plot as steps of the history, moving about not', () => {
    const view = initialView()
    expect(stepsOf({ ...view, selected: 3, picked: [5], find: 'x', closeUp: true })).toBe(stepsOf(view))
    for (const changed of [{ plot: 'abundance' as const }, { verdicts: ['level' as const] }, { flags: 'flagged' as const }, { area: { pane: 'laneA' as const, corners: [[1, 2] as const, [3, 2] as const, [3, 4] as const] } }]) {
      expect(stepsOf({ ...view, ...changed })).not.toBe(stepsOf(view))
    }
  })
})
