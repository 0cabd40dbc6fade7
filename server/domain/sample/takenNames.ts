/** A row that is given a name in this act: its key, the name it would have, and the one it had (null: a new row). */
export interface NameGiven { key: string, name: string, before: string | null }

/**
 * Names are unique within a study, whatever their case. Of the names given in one act, returns the keys of those that can't be
 * had: rows that keep their name come first, then names in the order given. Two samples may swap names in one act.
 */
export function takenNames(keeping: readonly string[], given: readonly NameGiven[]): Set<string> {
  const refused = new Set<string>()
  for (let settled = false; !settled;) {
    settled = true
    const taken = new Set(keeping.map(lower))
    for (const { key, before } of given) if (refused.has(key) && before !== null) taken.add(lower(before))
    for (const { key, name } of given) {
      if (refused.has(key)) continue
      if (taken.has(lower(name))) {
        // A refused row keeps its old name, which another may have counted on: look again from the start.
        refused.add(key)
        settled = false
      }
      taken.add(lower(name))
    }
  }
  return refused
}

const lower = (name: string) => name.trim().toLowerCase()
