import { wholeNumber } from '../../../../shared/science/numeric/numberWords'

/** What was noticed while a file was read, as sentences. */
export function traceRemarks({ withoutTime, odd, profileScans, scans }: { withoutTime: number, odd: number, profileScans: number, scans: number }): string[] {
  const remarks: string[] = []
  if (profileScans > 0) remarks.push(profileScans === scans ? 'The file holds profile data, not centroids: an extracted trace sums the whole width of a peak within the tolerance.' : `${wholeNumber(profileScans)} of its ${wholeNumber(scans)} scans are profile data, not centroids.`)
  if (withoutTime > 0) remarks.push(`${wholeNumber(withoutTime)} ${withoutTime === 1 ? 'scan does' : 'scans do'} not say when ${withoutTime === 1 ? 'it was' : 'they were'} taken and ${withoutTime === 1 ? 'was' : 'were'} passed over.`)
  if (odd > 0) remarks.push(`${wholeNumber(odd)} ${odd === 1 ? 'point' : 'points'} with an m/z or an intensity that can't be ${odd === 1 ? 'was' : 'were'} left out.`)
  return remarks
}
