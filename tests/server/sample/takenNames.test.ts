import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { takenNames, type NameGiven } from '../../../server/domain/sample/takenNames'

/** As the rule says it: again and again from the start, until nobody more is refused. */
function slowly(keeping: readonly string[], given: readonly NameGiven[]): Set<string> {
  const refused = new Set<string>()
  for (let settled = false; !settled;) {
    settled = true
    const taken = new Set([...keeping, ...given.flatMap(({ key, before }) => refused.has(key) && before !== null ? [before] : [])])
    for (const { key, name } of given) {
      if (refused.has(key)) continue
      if (taken.has(name)) {
        refused.add(key)
        settled = false
      }
      taken.add(name)
    }
  }
  return refused
}

describe('names given in one act', () => {
  it('are refused as the rule says, in any order of refusals', () => {
    fc.assert(fc.property(fc.array(fc.record({ name: fc.constantFrom(...'abcdefgh'), renamed: fc.boolean() }), { maxLength: 8 }), fc.boolean(), (rows, keepsOne) => {
      const given = rows.map(({ name, renamed }, index): NameGiven => ({ key: String(index), name, before: renamed ? 'abcdefgh'.charAt(index) : null }))
      const keeping = keepsOne ? ['h'] : []
      expect(takenNames(keeping, given)).toEqual(slowly(keeping, given))
    }), { numRuns: 500 })
  })

  it('are settled at once where each of a full sheet counts on the next', () => {
    const given = Array.from({ length: 20_000 }, (_, index) => ({ key: String(index), name: `n${index + 1}`, before: `n${index}` }))
    expect(takenNames(['n20000'], given).size).toBe(20_000)
  })
})
