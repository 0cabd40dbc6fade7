/** Members of one alignment: one column a table, the table's row in each feature (−1 = none). */
export type MemberColumns = readonly Int32Array[]

/**
 * Finds each feature of one alignment in another of the same tables: the one that holds its most intense member.
 * Where two would be found in the same feature, the more intense keeps it.
 * @param member members after, one column a shared table
 * @param intensity intensities after, in the same order (NaN = not detected)
 * @param memberBefore members before, in the same order of tables
 * @returns the feature before for each feature after; −1: none
 */
export function matchFeatures(member: MemberColumns, intensity: readonly Float64Array[], memberBefore: MemberColumns): Int32Array {
  const features = member[0]?.length ?? 0
  const featuresBefore = memberBefore[0]?.length ?? 0
  const strongest = new Float64Array(features)
  const candidate = new Int32Array(features).fill(-1)
  for (let t = 0; t < member.length; t++) {
    const featureOfRow = featuresByRow(memberBefore[t]!)
    for (let i = 0; i < features; i++) {
      const row = member[t]![i]!
      const value = intensity[t]![i]!
      if (row < 0 || !(value > strongest[i]!)) continue
      strongest[i] = value
      candidate[i] = row < featureOfRow.length ? featureOfRow[row]! : -1
    }
  }
  const keeper = new Int32Array(featuresBefore).fill(-1)
  for (let i = 0; i < features; i++) {
    const before = candidate[i]!
    if (before < 0) continue
    if (keeper[before]! < 0 || strongest[i]! > strongest[keeper[before]!]!) keeper[before] = i
  }
  return candidate.map((before, i) => before >= 0 && keeper[before] === i ? before : -1)
}

function featuresByRow(member: Int32Array): Int32Array {
  let rows = 0
  for (const row of member) if (row >= rows) rows = row + 1
  const featureOfRow = new Int32Array(rows).fill(-1)
  for (let i = 0; i < member.length; i++) if (member[i]! >= 0) featureOfRow[member[i]!] = i
  return featureOfRow
}
