export interface PairScore {
  pairPrecision: number
  pairRecall: number
}

/**
 * Compares groups with the truth by pairs of features in the same group. A pair of two noise rows is not counted; a compound
 * beside noise or another compound is wrong. Recall counts the true pairs of different tables.
 */
export function scorePairs(members: readonly Int32Array[], truth: readonly Int32Array[]): PairScore {
  const groups = members[0]?.length ?? 0
  let right = 0
  let counted = 0
  for (let g = 0; g < groups; g++) {
    const compounds: number[] = []
    members.forEach((rows, table) => {
      const row = rows[g] ?? -1
      if (row >= 0) compounds.push(truth[table]?.[row] ?? -1)
    })
    const ofCompound = new Map<number, number>()
    for (const compound of compounds) ofCompound.set(compound, (ofCompound.get(compound) ?? 0) + 1)
    const noise = ofCompound.get(-1) ?? 0
    counted += pairs(compounds.length) - pairs(noise)
    for (const [compound, count] of ofCompound) if (compound >= 0) right += pairs(count)
  }
  return { pairPrecision: right / counted, pairRecall: right / truePairs(truth) }
}

function truePairs(truth: readonly Int32Array[]): number {
  const tablesOf = new Map<number, number>()
  for (const rows of truth) for (const compound of new Set(rows)) if (compound >= 0) tablesOf.set(compound, (tablesOf.get(compound) ?? 0) + 1)
  return [...tablesOf.values()].reduce((sum, count) => sum + pairs(count), 0)
}

const pairs = (count: number) => count * (count - 1) / 2
