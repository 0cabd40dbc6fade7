import type { AlignmentResult, FeatureTable } from '../../shared/science/alignment/types'

/** An alignment in a form in which neither the order of tables nor of rows shows: each group with its members' values, by digest. */
export function canonicalGroups(tables: readonly FeatureTable[], result: AlignmentResult): string[] {
  return Array.from(result.mz, (mz, group) => {
    const members = tables.flatMap((table, position) => {
      const row = result.members[position]?.[group] ?? -1
      if (row < 0) return []
      const values = [table.mz, table.retentionMinutes, table.intensity, result.correctedMinutes[position]].map(column => column?.[row])
      return [`${table.digest}: ${values.join(' ')}`]
    }).sort()
    return `${mz} ${result.retentionMinutes[group]} | ${members.join(' | ')}`
  }).sort()
}
