/** A row that is given a name in this act: its key, the name it would have, and the one it had (null: a new row). */
export interface NameGiven { key: string, name: string, before: string | null }

/**
 * Names are unique within a study, whatever their case. Of the names given in one act, returns the keys of those that can't be
 * had: rows that keep their name come first, then names in the order given. Two samples may swap names in one act.
 */
export function takenNames(keeping: readonly string[], given: readonly NameGiven[]): Set<string> {
  const kept = new Set(keeping.map(lower))
  const firstWith = new Map<string, NameGiven>()
  const refused = new Set<string>()
  const waiting: NameGiven[] = []
  const refuse = (row: NameGiven) => {
    if (refused.has(row.key)) return
    refused.add(row.key)
    waiting.push(row)
  }
  for (const row of given) {
    const name = lower(row.name)
    if (kept.has(name) || firstWith.has(name)) refuse(row)
    else firstWith.set(name, row)
  }
  // A refused row keeps its old name, which another may have counted on.
  for (let row = waiting.pop(); row; row = waiting.pop()) {
    const other = row.before === null ? undefined : firstWith.get(lower(row.before))
    if (other) refuse(other)
  }
  return refused
}

const lower = (name: string) => name.trim().toLowerCase()
