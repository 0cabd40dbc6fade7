import { median } from '../numeric/median'
import { fitDrift, noDrift, type DriftCurve } from './drift'
import { brightFeatures, findLandmarks, type BrightFeatures } from './landmarks'
import type { AlignmentSettings } from './settings'
import { compareText } from './stack'
import type { FeatureTable } from './types'

/** An offset below this is left as it is, ppm. */
export const leastOffsetPpm = 1
/** Fewer landmarks than this say nothing of an offset. */
export const fewestForOffset = 5

/**
 * Where a table's drift curve comes from. reference: it is the one others are fitted to. own: its landmarks. borrowed: its
 * neighbour in run order. few / scattered: none, and why. off: switched off. empty: no features.
 */
export type CurveSource = 'reference' | 'own' | 'borrowed' | 'few' | 'scattered' | 'off' | 'empty'

/** What is taken out of one table, and on what ground. */
export interface Correction {
  source: CurveSource
  offsetPpm: number
  offsetApplied: boolean
  landmarks: number
  shareNear: number
  borrowedFrom: number | null
  curve: DriftCurve
  /** Number of widely shared groups the curve was fitted to once more; 0 where it was not. */
  refinedOn: number
}

/** Position of the reference: the one asked for, else the non-blank table with most features (ties: smallest digest); −1 where all are empty. */
export function pickReference(tables: readonly FeatureTable[], referenceDigest: string | null): number {
  const filled = tables.map((_, position) => position).filter(position => tables[position]!.mz.length > 0)
  const asked = filled.find(position => tables[position]!.digest === referenceDigest)
  if (asked !== undefined) return asked
  const samples = filled.filter(position => !tables[position]!.blank)
  const candidates = samples.length > 0 ? samples : filled
  candidates.sort((a, b) => tables[b]!.mz.length - tables[a]!.mz.length || compareText(tables[a]!.digest, tables[b]!.digest) || a - b)
  return candidates[0] ?? -1
}

/** First round of correction: each table against the reference by landmarks. */
export function firstCorrections(
  tables: readonly FeatureTable[], reference: number, settings: AlignmentSettings, onShare: (share: number) => void,
): Correction[] {
  const bright = reference < 0 ? null : brightFeatures(tables[reference]!)
  const corrections = tables.map((table, position) => {
    onShare(position / tables.length)
    return bright === null || table.mz.length === 0 ? uncorrected('empty') : position === reference ? uncorrected('reference') : byLandmarks(table, bright, settings)
  })
  corrections.forEach((correction, position) => {
    if (correction.source === 'few') borrow(tables, corrections, position, settings)
  })
  return corrections
}

function uncorrected(source: CurveSource): Correction {
  return { source, offsetPpm: 0, offsetApplied: false, landmarks: 0, shareNear: Number.NaN, borrowedFrom: null, curve: noDrift, refinedOn: 0 }
}

function byLandmarks(table: FeatureTable, reference: BrightFeatures, settings: AlignmentSettings): Correction {
  const landmarks = findLandmarks(brightFeatures(table), reference, settings)
  const points = landmarks.minutes.length
  const correction: Correction = { ...uncorrected('off'), landmarks: points }
  if (points > 0) correction.offsetPpm = median(landmarks.offsetPpm)
  correction.offsetApplied = settings.correctOffset && points >= fewestForOffset && Math.abs(correction.offsetPpm) > leastOffsetPpm
  if (!settings.correctDrift) return correction
  const fit = fitDrift(landmarks.minutes, landmarks.shiftMinutes, settings.retentionMinutes)
  correction.shareNear = fit.shareNear
  correction.source = fit.curve ? 'own' : Number.isNaN(fit.shareNear) ? 'few' : 'scattered'
  correction.curve = fit.curve ?? noDrift
  return correction
}

/** Takes over the curve of the table nearest in run order that has one of its own, and its offset where too few landmarks tell. */
function borrow(tables: readonly FeatureTable[], corrections: Correction[], position: number, settings: AlignmentSettings): void {
  const own = tables[position]!.runOrder
  if (own === null) return
  const distance = (other: number) => Math.abs((tables[other]!.runOrder ?? Number.POSITIVE_INFINITY) - own)
  const lenders = corrections.map((_, other) => other)
    .filter(other => (corrections[other]!.source === 'own' || corrections[other]!.source === 'reference') && tables[other]!.runOrder !== null)
    .sort((a, b) => distance(a) - distance(b) || tables[a]!.runOrder! - tables[b]!.runOrder! || compareText(tables[a]!.digest, tables[b]!.digest))
  const lender = lenders[0]
  if (lender === undefined) return
  const correction = corrections[position]!
  correction.source = 'borrowed'
  correction.borrowedFrom = lender
  correction.curve = corrections[lender]!.curve
  if (correction.landmarks < fewestForOffset && settings.correctOffset) {
    correction.offsetPpm = corrections[lender]!.offsetPpm
    correction.offsetApplied = corrections[lender]!.offsetApplied
  }
}
