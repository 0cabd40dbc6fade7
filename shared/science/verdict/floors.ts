import type { ComparedSample } from './settings'
import type { SideSummary } from './sideSummary'

/** Floors of one side, normalised as its samples are. */
export interface SideFloors {
  /** Highest floor over its samples; NaN where one is not known. */
  highest: number
  /** Highest floor over the injections of each preparation, in the order of the side's preparations. */
  ofPreparation: number[]
  /** A preparation whose table is gap-filled without a stated floor: an empty cell there proves nothing. */
  unprovable: boolean[]
}

/** Gap-filled without a stated floor: its empty cells do not mean "below the floor". */
export function isUnprovable(sample: Pick<ComparedSample, 'gapFilled' | 'floorSource'>): boolean {
  return sample.gapFilled && sample.floorSource === 'estimated'
}

/** Floors of a side; a floor is at least the intensity limit. */
export function sideFloors(summary: SideSummary, side: 'A' | 'B', intensityLimit: number | null): SideFloors {
  const limit = intensityLimit ?? 0
  const floorOf = (index: number) => {
    const floor = summary.samples[index]?.floor ?? Number.NaN
    const counts = Number.isNaN(floor) && limit > 0 ? limit : Math.max(floor, limit)
    return counts * (summary.factor[index] ?? Number.NaN)
  }
  const own = summary.preparations.filter(preparation => preparation.side === side)
  const ofPreparation = own.map(({ injections }) => Math.max(...injections.map(floorOf)))
  const unprovable = own.map(({ injections }) => injections.some((index) => {
    const sample = summary.samples[index]
    return sample !== undefined && isUnprovable(sample)
  }))
  return { highest: Math.max(...ofPreparation), ofPreparation, unprovable }
}
