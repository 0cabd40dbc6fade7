import { firstPlace } from '#shared/science/numeric/firstPlace'

/** Features that can be picked. */
export interface PickablePeaks {
  /** Time of each feature of the alignment. */
  minutes: Float64Array
  /** How high each stands on the clicked half; NaN where it does not stand there. */
  level: Float64Array
  /** Those that can be picked, in ascending order of time. */
  byTime: Int32Array
}

/**
 * The feature that a click means: of those whose top lies within `reachMinutes` of the clicked time the one that stands highest
 * on the clicked half, for that is the peak one sees; where none stands there, the nearest in time. Null: no top within reach.
 */
export function pickPeak({ minutes, level, byTime }: PickablePeaks, clickedMinutes: number, reachMinutes: number): number | null {
  let picked: number | null = null
  const levelOf = (feature: number | null) => feature === null || !(level[feature]! > 0) ? 0 : level[feature]!
  const distance = (feature: number) => Math.abs(minutes[feature]! - clickedMinutes)
  for (let k = firstPlace(byTime.length, place => minutes[byTime[place]!]! >= clickedMinutes - reachMinutes); k < byTime.length; k++) {
    const feature = byTime[k]!
    if (minutes[feature]! > clickedMinutes + reachMinutes) break
    const gain = levelOf(feature) - levelOf(picked)
    if (picked === null || gain > 0 || (gain === 0 && distance(feature) < distance(picked))) picked = feature
  }
  return picked
}
