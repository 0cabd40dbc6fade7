import { matchSample } from '../../../shared/science/table/matchSample'

export interface FoundSample {
  sampleId: string | null
  /** The name of a sample that fits but has a table already. */
  taken: string | null
}

/** Finds the sample of each of several tables by name. A sample has one table at a time; `leaving` are tables that are about to be replaced. */
export function sampleFinder(samples: readonly { id: string, name: string }[], standing: readonly { id: string, sampleId: string | null }[], leaving: ReadonlySet<string>) {
  const occupied = new Set(standing.flatMap(table => table.sampleId === null || leaving.has(table.id) ? [] : [table.sampleId]))
  const names = samples.map(sample => sample.name)
  const claim = (sampleId: string): FoundSample => {
    if (occupied.has(sampleId)) return { sampleId: null, taken: samples.find(sample => sample.id === sampleId)?.name ?? null }
    occupied.add(sampleId)
    return { sampleId, taken: null }
  }
  const byName = (name: string): FoundSample => {
    const place = matchSample(name, names)
    const sample = place === null ? undefined : samples[place]
    return sample ? claim(sample.id) : { sampleId: null, taken: null }
  }
  return { claim, byName }
}
