import { firstNotBelow } from '#shared/science/numeric/firstPlace'
import { highestOf, type Curve } from '~/charts/chromatogramCurves'
import type { PeakMark } from '~/charts/chromatogramLabels'

/** So far beside its time a feature's top is looked for, minutes: on its own trace, and on one where others stand beside it. */
const BESIDE_ALONE = 0.05
const BESIDE_OTHERS = 0.02

/** What a mark needs to know of the features. */
export interface MarkedFeatures {
  mz: Float64Array
  retentionMinutes: Float64Array
  /** Median level of each side, NaN where it is not found. */
  levelA: Float64Array
  levelB: Float64Array
  selected: number | null
  picked: readonly number[]
  flagged: readonly number[]
}

/**
 * A mark for each feature looked at, and for each flagged one where the whole run is drawn: at the top of the side's mean near
 * its time, on the side that holds more of the feature: the higher line there may be another compound's. Where the features' own traces are extracted, each on its own and no other.
 */
export function peakMarks(curves: readonly Curve[], { mz, retentionMinutes, levelA, levelB, selected, picked, flagged }: MarkedFeatures, textOf: (mz: number) => string): PeakMark[] {
  const extracted = new Set(curves.flatMap(({ feature }) => feature ?? []))
  const why = new Map<number, PeakMark['why']>()
  if (extracted.size === 0) for (const feature of flagged) why.set(feature, 'flagged')
  for (const feature of picked) why.set(feature, 'picked')
  if (selected !== null) why.set(selected, 'selected')
  return [...why].flatMap(([feature, reason]): PeakMark[] => {
    const minutes = retentionMinutes[feature]
    if (minutes === undefined || (extracted.size > 0 && !extracted.has(feature))) return []
    const topOf = (side: 'A' | 'B') => Math.max(0, ...curves.filter(curve => curve.side === side && curve.sampleName === null && (curve.feature === null || curve.feature === feature)).map(curve => topBeside(curve, minutes)))
    const side = (levelA[feature] || 0) >= (levelB[feature] || 0) ? 'A' : 'B'
    return [{ feature, side, minutes, height: topOf(side), why: reason, text: textOf(mz[feature] ?? Number.NaN) }]
  })
}

function topBeside({ minutes, values, feature }: Curve, time: number): number {
  const beside = feature === null ? BESIDE_OTHERS : BESIDE_ALONE
  return highestOf(values, firstNotBelow(minutes, time - beside), firstNotBelow(minutes, time + beside))
}
