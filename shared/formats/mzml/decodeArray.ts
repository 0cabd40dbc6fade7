import { Buffer } from 'node:buffer'
import { inflateSync } from 'node:zlib'
import { MzmlRefused } from './mzmlRefused'
import type { ParamList } from './params'
import { FLOAT_32, FLOAT_64, NO_COMPRESSION, ZLIB } from './terms'

/** How the numbers of one array are written. */
export interface ArrayEncoding { width: 4 | 8, zlib: boolean }

/** Base64 has four letters for three bytes; honest files add line breaks, and zlib a few bytes where nothing is gained. */
const SLACK = 1.5
const SLACK_CHARACTERS = 4096

/**
 * Reads from an array's terms how it is written.
 * @throws MzmlRefused naming what is not supported
 */
export function arrayEncoding(params: ParamList, where: string): ArrayEncoding {
  const other = params.all().find(({ accession, name }) => accession !== ZLIB && accession !== NO_COMPRESSION && /compression|numpress|encoding|truncation/i.test(name))
  if (other) throw new MzmlRefused(`The file's numbers are packed by “${other.name.slice(0, 120)}”, a compression that is not supported. Please export it with zlib compression, or with none.`)
  if (!params.has(ZLIB) && !params.has(NO_COMPRESSION)) throw new MzmlRefused(`${where} does not say how its numbers are compressed. Zlib and none are read.`)
  if (!params.has(FLOAT_64) && !params.has(FLOAT_32)) {
    const type = params.all().find(({ name }) => /integer|float|string/i.test(name))
    throw new MzmlRefused(type ? `${where} holds numbers written as “${type.name.slice(0, 120)}”, which is not supported. 32-bit and 64-bit floats are read.` : `${where} does not say what kind of numbers it holds.`)
  }
  return { width: params.has(FLOAT_64) ? 8 : 4, zlib: params.has(ZLIB) }
}

/**
 * Unpacks the base64 text of one array. It must hold exactly the values that are declared, so nothing ever unpacks to more.
 * @throws MzmlRefused where it holds fewer or more
 */
export function decodeArray(text: string, length: number, { width, zlib }: ArrayEncoding, where: string): Float64Array {
  const wanted = length * width
  const tooLong = () => new MzmlRefused(`${where} unpacks to far more than the ${length} values that it declares.`)
  if (text.length > wanted * SLACK * 4 / 3 + SLACK_CHARACTERS) throw tooLong()
  const packed = Buffer.from(text, 'base64')
  const bytes = zlib && packed.length > 0 ? inflate(packed, wanted, tooLong, where) : packed
  if (bytes.length !== wanted) throw new MzmlRefused(`${where} holds ${Math.floor(bytes.length / width)} values where ${length} are declared. The file is damaged.`)
  const values = width === 8 ? new Float64Array(length) : new Float32Array(length)
  new Uint8Array(values.buffer).set(bytes)
  return values instanceof Float64Array ? values : Float64Array.from(values)
}

function inflate(packed: Buffer, most: number, tooLong: () => MzmlRefused, where: string): Buffer {
  try {
    return inflateSync(packed, { maxOutputLength: Math.max(1, most) })
  }
  catch (error) {
    if (error instanceof RangeError) throw tooLong()
    throw new MzmlRefused(`${where} can't be unpacked: its zlib data are damaged.`)
  }
}
