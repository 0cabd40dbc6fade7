/**
 * The only place where columns of numbers become bytes and back: little-endian Float64 or Int32, one after the other.
 * NaN stands for "not detected". better-sqlite3 hands out buffers at any offset, so reading copies where it must.
 */
export function packFloat64(values: Float64Array): Buffer {
  return Buffer.from(values.buffer, values.byteOffset, values.byteLength)
}

export function packInt32(values: Int32Array): Buffer {
  return Buffer.from(values.buffer, values.byteOffset, values.byteLength)
}

export function unpackFloat64(bytes: Uint8Array): Float64Array {
  const { buffer, byteOffset } = aligned(bytes, 8)
  return new Float64Array(buffer, byteOffset, bytes.byteLength / 8)
}

export function unpackInt32(bytes: Uint8Array): Int32Array {
  const { buffer, byteOffset } = aligned(bytes, 4)
  return new Int32Array(buffer, byteOffset, bytes.byteLength / 4)
}

function aligned(bytes: Uint8Array, unit: number): Uint8Array {
  if (bytes.byteLength % unit !== 0) throw new RangeError(`${bytes.byteLength} bytes are no whole number of ${unit}-byte values`)
  return bytes.byteOffset % unit === 0 ? bytes : Uint8Array.from(bytes)
}
