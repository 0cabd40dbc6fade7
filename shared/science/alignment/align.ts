import { certainGroups, settlePieces, sortPieces, type Groups } from './correspondence'
import { correctMinutes } from './drift'
import { firstCorrections, pickReference, type Correction } from './firstCorrection'
import { consensusGroups, enoughConsensusGroups } from './refine'
import { writeResult } from './result'
import { secondCorrections } from './secondCorrection'
import type { AlignmentSettings } from './settings'
import { stackFeatures, type FeatureStack } from './stack'
import type { AlignmentProgress, AlignmentResult, FeatureTable } from './types'

/**
 * Finds which features of different tables are the same: mass offset and retention drift are taken out by
 * landmarks shared with a reference table, features are brought into groups, drift is fitted once more to groups that most
 * tables share, and features are brought into groups again. The order of tables and of rows changes nothing but the order
 * in which they are listed.
 *
 * @param tables of one polarity; not changed
 * @param settings tolerances in ppm, Da and minutes
 * @param onProgress told of the share done, 0 to 1, and the stage
 * @throws RangeError where a table's columns differ in length or hold a value that is no m/z, time or intensity
 */
export function align(tables: readonly FeatureTable[], settings: AlignmentSettings, onProgress: AlignmentProgress = () => {}): AlignmentResult {
  tables.forEach(checkTable)
  const stage = (from: number, to: number, name: string) => (share: number) => onProgress(from + (to - from) * share, name)
  const reference = pickReference(tables, settings.referenceDigest)
  const first = firstCorrections(tables, reference, settings, stage(0, 0.15, 'Looking for landmarks'))
  const stack = stackFeatures(tables, first.map(correction => correction.offsetApplied ? correction.offsetPpm : 0))
  const { minutes, corrections } = refineTimes(tables, first, stack, settings, stage(0.15, 0.45, 'Fitting drift'))
  const pieces = sortPieces(stack, minutes, settings)
  const found = settlePieces(stack, minutes, pieces, settings, stage(0.5, 0.95, 'Bringing features into groups'))
  onProgress(0.95, 'Writing the result')
  return writeResult(tables, stack, minutes, found, corrections, reference, settings)
}

function refineTimes(
  tables: readonly FeatureTable[], first: Correction[], stack: FeatureStack, settings: AlignmentSettings, onShare: (share: number) => void,
): { minutes: Float64Array, corrections: Correction[] } {
  const minutes = correctedMinutes(stack, first)
  if (!settings.correctDrift || tables.length < 2) return { minutes, corrections: first }
  const pieces = sortPieces(stack, minutes, settings)
  let found: Groups = certainGroups(pieces)
  let chosen = consensusGroups(found, minutes, tables.length)
  if (chosen.length < enoughConsensusGroups) {
    found = settlePieces(stack, minutes, pieces, settings, onShare)
    chosen = consensusGroups(found, minutes, tables.length)
  }
  const corrections = secondCorrections(first, stack, found, chosen, minutes, settings)
  return { minutes: correctedMinutes(stack, corrections), corrections }
}

function correctedMinutes(stack: FeatureStack, corrections: readonly Correction[]): Float64Array {
  const curves = Array.from(stack.inputPosition, position => corrections[position]!.curve)
  const minutes = new Float64Array(stack.size)
  for (let i = 0; i < stack.size; i++) minutes[i] = correctMinutes(curves[stack.table[i]!]!, stack.rawMinutes[i]!)
  return minutes
}

function checkTable({ mz, retentionMinutes, intensity }: FeatureTable, position: number): void {
  const name = `Table ${position + 1}`
  if (retentionMinutes.length !== mz.length || intensity.length !== mz.length) {
    throw new RangeError(`${name}: its columns differ in length (${mz.length} m/z, ${retentionMinutes.length} times, ${intensity.length} intensities).`)
  }
  for (let row = 0; row < mz.length; row++) {
    if (!(mz[row]! > 0 && mz[row]! < 1e5)) throw new RangeError(`${name}, row ${row + 1}: ${mz[row]} is no m/z between 0 and 100,000.`)
    if (!(retentionMinutes[row]! >= 0 && Number.isFinite(retentionMinutes[row]!))) throw new RangeError(`${name}, row ${row + 1}: ${retentionMinutes[row]} is no time in minutes.`)
    if (!(intensity[row]! > 0 && Number.isFinite(intensity[row]!))) throw new RangeError(`${name}, row ${row + 1}: ${intensity[row]} is no intensity above 0.`)
  }
}
