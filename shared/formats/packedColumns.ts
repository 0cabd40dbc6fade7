/**
 * A table of numbers as bytes, for the wire and for storage: "STLYCOLS", the header's length (Uint32), the header as JSON
 * ({ meta, columns: [{ name, type, length }] }), then each column, every part beginning at a multiple of 8. Little-endian.
 */
const MAGIC = 'STLYCOLS'
const UNIT = 8

export type Column = Float64Array | Float32Array | Int32Array | Uint16Array | Uint8Array
export type Columns = Record<string, Column>

const TYPES = { f8: Float64Array, f4: Float32Array, i4: Int32Array, u2: Uint16Array, u1: Uint8Array } as const
type TypeName = keyof typeof TYPES
const TYPE_NAMES = Object.keys(TYPES) as TypeName[]

interface Header { meta: unknown, columns: { name: string, type: TypeName, length: number }[] }

const padded = (length: number) => Math.ceil(length / UNIT) * UNIT

/** Packs columns, in their order, with anything JSON can hold beside them. */
export function packColumns(meta: unknown, columns: Columns): Uint8Array<ArrayBuffer> {
  const entries = Object.entries(columns)
  const header: Header = { meta, columns: entries.map(([name, values]) => ({ name, type: typeOf(values), length: values.length })) }
  const json = new TextEncoder().encode(JSON.stringify(header))
  const start = padded(MAGIC.length + 4 + json.length)
  const bytes = new Uint8Array(start + entries.reduce((sum, [, values]) => sum + padded(values.byteLength), 0))
  bytes.set(new TextEncoder().encode(MAGIC))
  new DataView(bytes.buffer).setUint32(MAGIC.length, json.length, true)
  bytes.set(json, MAGIC.length + 4)
  let at = start
  for (const [, values] of entries) {
    bytes.set(new Uint8Array(values.buffer, values.byteOffset, values.byteLength), at)
    at += padded(values.byteLength)
  }
  return bytes
}

/**
 * Reads what packColumns wrote; columns are views on the bytes where these lie at a multiple of 8, else on a copy.
 * @throws RangeError where the bytes are something else or cut short
 */
export function unpackColumns(source: ArrayBuffer | Uint8Array): { meta: unknown, columns: Columns } {
  const given = source instanceof Uint8Array ? source : new Uint8Array(source)
  const bytes = given.byteOffset % UNIT === 0 ? given : Uint8Array.from(given)
  const head = MAGIC.length + 4
  if (bytes.length < head || new TextDecoder().decode(bytes.subarray(0, MAGIC.length)) !== MAGIC) throw new RangeError('These bytes are no packed columns.')
  const jsonLength = new DataView(bytes.buffer, bytes.byteOffset).getUint32(MAGIC.length, true)
  if (head + jsonLength > bytes.length) throw new RangeError('These packed columns are cut short.')
  const header = JSON.parse(new TextDecoder().decode(bytes.subarray(head, head + jsonLength))) as Header
  const columns: Columns = {}
  let at = padded(head + jsonLength)
  for (const { name, type, length } of header.columns) {
    const Type = TYPES[type]
    const byteLength = length * Type.BYTES_PER_ELEMENT
    if (at + byteLength > bytes.length) throw new RangeError('These packed columns are cut short.')
    columns[name] = new Type(bytes.buffer as ArrayBuffer, bytes.byteOffset + at, length)
    at += padded(byteLength)
  }
  return { meta: header.meta, columns }
}

/** A column that must be there and of this type. */
export function columnOf<T extends Column>(columns: Columns, name: string, Type: new (length: number) => T): T {
  const values = columns[name]
  if (!(values instanceof Type)) throw new RangeError(`The packed columns lack “${name}”.`)
  return values
}

function typeOf(values: Column): TypeName {
  const name = TYPE_NAMES.find(type => values instanceof TYPES[type])
  if (!name) throw new RangeError('Only columns of numbers can be packed.')
  return name
}
