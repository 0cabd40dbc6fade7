import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ABUNDANCE_LAYOUTS, initialView, isFilteredView, PLOTS, queryToView, SIGNALS, stepsOf, viewFields, viewToQuery, withoutFilter, type BenchView } from '../../../app/utils/benchView'
import { FURTHER_GROUPS } from '../../../app/utils/componentsView'
import { AREA_PANES, MOST_CORNERS } from '../../../app/utils/plotArea'
import { ALWAYS_SHOWN, COLUMN_IDS } from '../../../app/utils/columnLayout'
import { MOST_SORTS, SORT_KEYS } from '../../../app/utils/featureOrder'
import { OPEN_RANGE } from '../../../app/utils/numberRange'
import { COMPONENT_SCALINGS } from '../../../shared/science/components/scaleFeatures'
import { TRACE_KINDS, TRACE_ORIGINS, TRACE_SCALES, type TimeWindow } from '../../../app/utils/traceView'
import { flagKinds } from '../../../shared/schemas/flag'
import { COUNTED_VERDICTS } from '../../../shared/science/verdict/verdicts'

const decimals = (places: number, largest: number) => fc.integer({ min: -largest * 10 ** places, max: largest * 10 ** places }).map(value => value / 10 ** places)
const ends = fc.tuple(decimals(3, 400), fc.integer({ min: 20, max: 400_000 })).map(([low, by]): [number, number] => [low, Number((low + by / 1000).toFixed(3))])
const bound = fc.option(fc.double({ noNaN: true, noDefaultInfinity: true }).map(value => value + 0), { nil: null })
const range = fc.record({ from: bound, to: bound })
const ppm = fc.integer({ min: 1, max: 10_000 })
const mass = fc.option(fc.record({ value: fc.double({ min: 1, max: 99_999, noNaN: true }), ppm }), { nil: null })
const view: fc.Arbitrary<BenchView> = fc.record({
  selected: fc.option(fc.nat(999_999), { nil: null }),
  picked: fc.uniqueArray(fc.nat(999_999), { maxLength: 100 }).map(all => all.sort((a, b) => a - b)),
  verdicts: fc.subarray([...COUNTED_VERDICTS]),
  flags: fc.constantFrom('all' as const, 'flagged' as const, ...flagKinds),
  find: fc.string({ maxLength: 40 }),
  massPpm: fc.integer({ min: 1, max: 100 }),
  abundanceLayout: fc.constantFrom(...ABUNDANCE_LAYOUTS),
  signal: fc.constantFrom(...SIGNALS),
  mzNear: mass,
  massNear: mass,
  formula: fc.option(fc.record({ formula: fc.constantFrom('C21H24O10', 'C6 H12 O6', 'C2H4(OH)2'), ppm }), { nil: null }),
  mzRange: range, minutes: range, ratio: range, fold: range, q: range, reach: range, intensity: range,
  sort: fc.uniqueArray(fc.record({ key: fc.constantFrom(...SORT_KEYS), descending: fc.boolean() }), { minLength: 1, maxLength: MOST_SORTS, selector: each => each.key }),
  columns: fc.tuple(fc.shuffledSubarray(COLUMN_IDS.filter(id => id !== ALWAYS_SHOWN)), fc.nat(10), fc.nat(10)).map(([others, place, frozen]) => {
    const shown = others.toSpliced(Math.min(place, others.length), 0, ALWAYS_SHOWN)
    return { shown, frozen: Math.min(frozen, shown.length) }
  }),
  plot: fc.constantFrom(...PLOTS),
  area: fc.option(fc.record({ pane: fc.constantFrom(...AREA_PANES), corners: fc.array(fc.tuple(decimals(4, 2000), decimals(4, 2000)), { minLength: 3, maxLength: MOST_CORNERS }) }), { nil: null }),
  foldWindow: fc.option(fc.record({ x: ends, y: ends }), { nil: null }),
  closeUp: fc.boolean(),
  componentPair: fc.constantFrom({ across: 1, upwards: 2 }, { across: 3, upwards: 1 }, { across: 4, upwards: 5 }),
  componentScaling: fc.constantFrom(...COMPONENT_SCALINGS),
  componentFeatures: fc.constantFrom('oneSide', 'bothSides'),
  componentGroups: fc.subarray([...FURTHER_GROUPS]),
  componentWithout: fc.uniqueArray(fc.nat(500), { maxLength: 20 }).map(all => all.sort((a, b) => a - b)),
  traceKind: fc.constantFrom(...TRACE_KINDS),
  traceScale: fc.constantFrom(...TRACE_SCALES),
  traceOrigin: fc.constantFrom(...TRACE_ORIGINS),
  traceWindow: fc.option(fc.tuple(fc.integer({ min: 0, max: 400_000 }), fc.integer({ min: 1, max: 90_000 })).map(([from, by]): TimeWindow => [from / 1000, (from + by) / 1000]), { nil: null }),
})

describe('the address of the bench', () => {
  it('gives back every view', () => {
    fc.assert(fc.property(view, (each) => {
      expect(queryToView(viewToQuery(each))).toEqual(each)
    }))
  })

  it('names each part otherwise', () => {
    const keys = Object.values(viewFields).map(({ key }) => key)
    expect(new Set([...keys, 'version']).size).toBe(keys.length + 1)
  })

  it('holds several keys of a sort, each once, the first foremost', () => {
    expect(viewToQuery({ ...initialView(), sort: [{ key: 'reach', descending: true }, { key: 'mz', descending: false }] }).sort).toBe('-reach.mz')
    expect(queryToView({ sort: '-reach.mz.reach.nothing' }).sort).toEqual([{ key: 'reach', descending: true }, { key: 'mz', descending: false }])
    expect(queryToView({ sort: 'nothing' }).sort).toEqual(initialView().sort)
  })

  it('knows whether filters stand, and clears them all', () => {
    fc.assert(fc.property(view, (each) => {
      const cleared = { ...each, ...withoutFilter() }
      expect(isFilteredView(cleared)).toBe(false)
      expect(isFilteredView(each)).toBe(Object.keys(withoutFilter()).some(name => JSON.stringify(each[name as keyof BenchView]) !== JSON.stringify(cleared[name as keyof BenchView])))
      expect(cleared.sort).toEqual(each.sort)
    }))
    for (const part of [{ q: { from: null, to: 0.05 } }, { formula: { formula: 'C6H12O6', ppm: 5 } }, { verdicts: ['level' as const] }]) expect(isFilteredView({ ...initialView(), ...part })).toBe(true)
    expect(initialView().q).toEqual(OPEN_RANGE)
  })

  it('is empty for the view as it opens', () => {
    expect(Object.values(viewToQuery(initialView())).filter(Boolean)).toEqual([])
  })

  it('takes any query without harm', () => {
    fc.assert(fc.property(fc.dictionary(fc.constantFrom(...Object.values(viewFields).map(({ key }) => key)), fc.oneof(fc.string(), fc.constant(null), fc.array(fc.string()))), (query) => {
      const read = queryToView(query)
      expect(read.sort.length).toBeGreaterThan(0)
      for (const { key } of read.sort) expect(SORT_KEYS).toContain(key)
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
