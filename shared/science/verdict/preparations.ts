import type { ComparedSample } from './settings'

/** What was independently taken and worked up, and its injections as positions in the samples. */
export interface Preparation {
  side: 'A' | 'B'
  label: string
  injections: number[]
}

const compareText = (a: string, b: string) => a < b ? -1 : a > b ? 1 : 0

/**
 * Groups the samples at `positions` by preparation; a sample without one stands for itself. The order is canonical
 * (side, label, name, id), so that sums do not depend on the order of the samples.
 */
export function groupPreparations(samples: readonly ComparedSample[], positions: readonly number[]): Preparation[] {
  const groups = new Map<string, Preparation>()
  const rows = positions.flatMap((position) => {
    const sample = samples[position]
    return sample?.side ? [{ position, side: sample.side, label: sample.preparation || sample.name, key: sample.preparation ? `p${sample.preparation}` : `s${sample.id}`, sample }] : []
  })
  rows.sort((a, b) => compareText(a.side, b.side) || compareText(a.label, b.label) || compareText(a.sample.name, b.sample.name) || compareText(a.sample.id, b.sample.id))
  for (const { position, side, label, key } of rows) {
    const group = groups.get(side + key)
    if (group) group.injections.push(position)
    else groups.set(side + key, { side, label, injections: [position] })
  }
  return [...groups.values()]
}
