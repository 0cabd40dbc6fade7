/** The columns of one feature table: m/z, minutes, intensity, and peak width in minutes where the file had one (NaN in rows without). */
export interface FeatureColumns { mz: Float64Array, minutes: Float64Array, intensity: Float64Array, width: Float64Array | null }

/**
 * The canonical bytes of a table, in pieces, for its digest: the number of rows and of columns as little-endian Int32,
 * then m/z, minutes, intensity and (if there) width as little-endian Float64. Pieces may share memory with the columns: don't change them.
 */
export function packColumns(columns: FeatureColumns): Uint8Array[] {
  const parts = [columns.mz, columns.minutes, columns.intensity, ...(columns.width ? [columns.width] : [])]
  const head = new DataView(new ArrayBuffer(8))
  head.setInt32(0, columns.mz.length, true)
  head.setInt32(4, parts.length, true)
  return [new Uint8Array(head.buffer), ...parts.map(littleEndian)]
}

const machineIsLittleEndian = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1

function littleEndian(values: Float64Array): Uint8Array {
  if (machineIsLittleEndian) return new Uint8Array(values.buffer, values.byteOffset, values.byteLength)
  const bytes = new DataView(new ArrayBuffer(values.byteLength))
  values.forEach((value, index) => bytes.setFloat64(index * 8, value, true))
  return new Uint8Array(bytes.buffer)
}
