import type { SideSummary } from './sideSummary'

export interface TraceCheck {
  /** Highest signal in the other side's traces over the level of the present side; NaN: not checked. */
  ratio: number
  /** Samples of the other side whose trace covers the feature. */
  samples: number
}

export const notChecked: TraceCheck = { ratio: Number.NaN, samples: 0 }

/**
 * Looks for what one side lacks in its traces. The present side's own traces are the measure; where they show nothing there, its
 * table's intensities where these are heights, since a trace gives heights too. Areas can't be compared with heights: not checked.
 */
export function checkTraces({ a, b }: SideSummary, i: number, present: 'A' | 'B'): TraceCheck {
  const [shown, other] = present === 'A' ? [a, b] : [b, a]
  const level = shown.traces.level[i]! > 0 ? shown.traces.level[i]! : shown.allHeights ? shown.median[i]! : Number.NaN
  return { ratio: other.traces.highest[i]! / level, samples: other.traces.covering[i]! }
}

/** Is what stands in the trace enough to doubt the absence: at least the present side's level over the reach limit? */
export function isSignal({ ratio }: TraceCheck, reachLimit: number): boolean {
  return ratio * reachLimit >= 1
}
