import type { VerdictColumns } from '../../../shared/science/verdict/verdictResult'
import { VERDICTS } from '../../../shared/science/verdict/verdicts'
import type { ChangedFeature, VersionChanges } from '../../../shared/types/comparison'

const MOST_FEATURES = 5000

/** Counts of verdicts before and after, and the features whose verdict changed. `match` null: the same alignment. */
export function changesOf(before: VerdictColumns, after: VerdictColumns, match: Int32Array | null): Omit<VersionChanges, 'before' | 'after' | 'differs'> {
  const size = VERDICTS.length
  const table = new Uint32Array(size * size)
  const changed: number[] = []
  let matched = 0
  for (let i = 0; i < after.verdict.length; i++) {
    const twin = match ? match[i]! : i
    if (twin < 0) continue
    matched++
    table[before.verdict[twin]! * size + after.verdict[i]!]!++
    if (before.verdict[twin] !== after.verdict[i]) changed.push(i)
  }
  const moves = [...table].flatMap((count, cell) => count > 0 ? [{ from: VERDICTS[Math.floor(cell / size)]!, to: VERDICTS[cell % size]!, count }] : [])
  changed.sort((i, j) => after.highestCounts[j]! - after.highestCounts[i]! || i - j)
  const features = changed.slice(0, MOST_FEATURES).map((i): ChangedFeature => {
    const twin = match ? match[i]! : i
    return {
      index: i, indexBefore: twin, mz: after.mz[i]!, retentionMinutes: after.retentionMinutes[i]!, highestCounts: after.highestCounts[i]!,
      from: VERDICTS[before.verdict[twin]!]!, to: VERDICTS[after.verdict[i]!]!, reasonFrom: before.reason[twin]!, reasonTo: after.reason[i]!,
    }
  })
  return { matched, onlyBefore: before.verdict.length - matched, onlyAfter: after.verdict.length - matched, moves, features, changed: changed.length }
}
