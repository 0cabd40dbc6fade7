import { correctMinutes, type DriftCurve } from '../alignment/drift'

/**
 * The times of a trace's scans on the common time of an alignment: minutes of the file less the drift of the sample's table.
 *
 * @param scanMinutes minutes a scan, as the file has them; not changed
 * @param curve drift of the sample's table in the alignment; without knots the times stay
 */
export function correctScans(scanMinutes: Float64Array, curve: DriftCurve): Float64Array {
  return scanMinutes.map(minutes => correctMinutes(curve, minutes))
}
