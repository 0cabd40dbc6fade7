import type { Groups } from './correspondence'
import { addDrift, fitDrift } from './drift'
import type { Correction } from './firstCorrection'
import { consensusPoints } from './refine'
import type { AlignmentSettings } from './settings'
import type { FeatureStack } from './stack'

/**
 * Second round of correction: each table with a curve of its own, and the reference, is fitted once more to the median times of
 * widely shared groups; who borrowed a curve takes over the new one. A table whose landmarks carried no curve stays as it is:
 * its features in shared groups lie within tolerance by themselves and would confirm anything.
 *
 * @param chosen the widely shared groups
 * @returns new corrections; those given are not changed
 */
export function secondCorrections(
  corrections: readonly Correction[], stack: FeatureStack, found: Groups, chosen: Int32Array, minutes: Float64Array, settings: AlignmentSettings,
): Correction[] {
  const points = consensusPoints(stack, found, minutes, chosen)
  const refined = corrections.map(correction => ({ ...correction }))
  points.forEach((own, number) => {
    const correction = refined[stack.inputPosition[number]!]!
    if (correction.source !== 'own' && correction.source !== 'reference') return
    const { curve } = fitDrift(own.minutes, own.shiftMinutes, settings.retentionMinutes)
    if (!curve) return
    correction.curve = addDrift(correction.curve, curve)
    correction.refinedOn = own.minutes.length
  })
  for (const correction of refined) {
    if (correction.borrowedFrom !== null) correction.curve = refined[correction.borrowedFrom]!.curve
  }
  return refined
}
