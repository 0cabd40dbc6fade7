import { withKnownFloor } from '../../../shared/formats/comparisonData'
import type { ComparedSample } from '../../../shared/science/verdict/settings'

/** A sample as JSON holds it: a floor that is not known, or not estimated yet, is null. */
export type StoredSample = Omit<ComparedSample, 'floor'> & { floor: number | null }

export function storeSample(sample: ComparedSample): StoredSample {
  return { ...sample, floor: Number.isNaN(sample.floor) ? null : sample.floor }
}

/** The samples of a version's row; JSON wrote a floor that is not known as null. */
export function readSamples(stored: readonly StoredSample[] | readonly ComparedSample[]): ComparedSample[] {
  return stored.map(withKnownFloor)
}
