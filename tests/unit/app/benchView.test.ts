import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { benchDefaults, queryToView, viewToQuery, type BenchView } from '../../../app/utils/benchView'
import { SORT_KEYS } from '../../../app/utils/featureOrder'
import { flagKinds } from '../../../shared/schemas/flag'
import { COUNTED_VERDICTS } from '../../../shared/science/verdict/verdicts'

const view: fc.Arbitrary<BenchView> = fc.record({
  selected: fc.option(fc.nat(999_999), { nil: null }),
  verdicts: fc.subarray([...COUNTED_VERDICTS]),
  flags: fc.constantFrom('all' as const, 'flagged' as const, ...flagKinds),
  find: fc.string({ maxLength: 40 }),
  massPpm: fc.integer({ min: 1, max: 100 }),
  sort: fc.record({ key: fc.constantFrom(...SORT_KEYS), descending: fc.boolean() }),
})

describe('the address of the bench', () => {
  it('gives back every view', () => {
    fc.assert(fc.property(view, (each) => {
      expect(queryToView(viewToQuery(each))).toEqual(each)
    }))
  })

  it('is empty for the view as it opens', () => {
    expect(Object.values(viewToQuery(benchDefaults)).filter(Boolean)).toEqual([])
  })

  it('takes any query without harm', () => {
    fc.assert(fc.property(fc.dictionary(fc.constantFrom('feature', 'verdict', 'flags', 'find', 'ppm', 'sort'), fc.oneof(fc.string(), fc.constant(null), fc.array(fc.string()))), (query) => {
      const read = queryToView(query)
      expect(SORT_KEYS).toContain(read.sort.key)
      expect(read.massPpm).toBeGreaterThan(0)
    }))
  })
})
