import { counted, signed, wholeNumber } from '../numeric/numberWords'
import { fewestLandmarks } from './drift'
import { fewestForOffset, leastOffsetPpm, type Correction } from './firstCorrection'
import type { AlignmentSettings } from './settings'

/** What was done about a table's offset and drift, and why, as sentences with numbers. */
export function driftReason(correction: Correction, settings: AlignmentSettings): string {
  if (correction.source === 'empty') return 'The table has no features: nothing to correct.'
  if (correction.source === 'reference') {
    return `The reference: the other tables are fitted to it.${correction.refinedOn > 0 ? ` Its times were then fitted to ${wholeNumber(correction.refinedOn)} groups that most tables share.` : ''}`
  }
  return `${offsetSentence(correction, settings)} ${timeSentence(correction, settings)}`
}

function offsetSentence({ offsetPpm, offsetApplied, landmarks, borrowedFrom }: Correction, settings: AlignmentSettings): string {
  const size = `${signed(offsetPpm, 1)} ppm`
  if (landmarks < fewestForOffset) {
    return borrowedFrom !== null && offsetApplied
      ? `With ${counted(landmarks, 'landmark')} to the reference the mass offset could not be judged; the neighbour's ${size} was taken out.`
      : `With ${counted(landmarks, 'landmark')} to the reference the mass offset could not be judged and none was taken out.`
  }
  if (offsetApplied) return `A mass offset of ${size} over ${counted(landmarks, 'landmark')} was taken out.`
  if (Math.abs(offsetPpm) <= leastOffsetPpm) return `The mass offset of ${size} over ${counted(landmarks, 'landmark')} is below ${leastOffsetPpm} ppm and was left.`
  return settings.correctOffset
    ? `The mass offset of ${size} was left.`
    : `The mass offset of ${size} over ${counted(landmarks, 'landmark')} was left: its correction is switched off.`
}

function timeSentence({ source, landmarks, shareNear, refinedOn }: Correction, settings: AlignmentSettings): string {
  switch (source) {
    case 'own': return `Times were corrected by a curve through ${counted(landmarks, 'landmark')}${refinedOn > 0 ? `, then through ${wholeNumber(refinedOn)} groups that most tables share` : ''}.`
    case 'borrowed': return `Fewer than ${fewestLandmarks} landmarks make no drift curve, so its neighbour's in run order was taken.`
    case 'few': return `Times were not corrected: ${counted(landmarks, 'landmark')} with the reference, ${fewestLandmarks} are needed, and no neighbour in run order has a curve.`
    case 'scattered': return `Times were not corrected: only ${Math.round(shareNear * 100)} % of ${counted(landmarks, 'landmark')} lie within ${settings.retentionMinutes} min of a smooth curve, and half must.`
    default: return 'Times were not corrected: drift correction is switched off.'
  }
}
