import { appendFileSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { MzmlRefused } from '../../../../shared/formats/mzml/mzmlRefused'
import { wholeNumber } from '../../../../shared/science/numeric/numberWords'
import { SLICE_DA, sliceOf, type Centroids } from '../../../../shared/science/traces/centroids'

const FIRST_POINTS = 256
/** Points of one slice that wait in memory before they are written. */
const MOST_WAITING = 8192
/** Points of all slices that wait: some 10 MB. */
const MOST_WAITING_IN_ALL = 500_000
/** Room for points of all slices, whether taken or not: 60 MB. Without it a file that fills one slice after the other takes gigabytes. */
const MOST_ROOM = 3_000_000
/** Points of one slice: it is sorted in memory, at about 60 bytes a point. */
const MOST_SLICE_POINTS = 8_000_000
const MOST_POINTS = 250_000_000
const HEAD_BYTES = 8
const POINT_BYTES = 20

interface Waiting extends Centroids { length: number, spilled: number }

/**
 * Gathers points by slices of m/z without holding them: what waits goes to a file a slice, in blocks (count, m/z, intensities, scans),
 * and comes back slice by slice once all have come.
 */
export class CentroidSpill {
  points = 0
  /** Points there is room for in memory. */
  room = 0
  private readonly slices = new Map<number, Waiting>()
  private waiting = 0

  constructor(private readonly path: string) {
    mkdirSync(path, { recursive: true, mode: 0o700 })
  }

  /** @throws MzmlRefused where there are more points than can be kept */
  add(mz: number, intensity: number, scan: number): void {
    const slice = sliceOf(mz)
    let own = this.slices.get(slice)
    if (!own) {
      this.slices.set(slice, own = { ...columns(FIRST_POINTS), length: 0, spilled: 0 })
      this.room += FIRST_POINTS
    }
    if (own.length === own.mz.length) this.makeRoom(slice, own)
    own.mz[own.length] = mz
    own.intensity[own.length] = intensity
    own.scan[own.length++] = scan
    this.points++
    if (++this.waiting >= MOST_WAITING_IN_ALL) for (const [each, waiting] of this.slices) this.write(each, waiting)
  }

  /** Slices with points, ascending. */
  all(): number[] {
    return [...this.slices.keys()].sort((a, b) => a - b)
  }

  /** The points of one slice in the order they came; its file goes. */
  take(slice: number): Centroids {
    const own = this.slices.get(slice)
    if (!own) return columns(0)
    this.slices.delete(slice)
    const all = columns(own.spilled + own.length)
    let at = 0
    if (own.spilled > 0) {
      const file = this.file(slice)
      const bytes = readFileSync(file)
      for (let from = 0; from < bytes.length;) {
        const length = bytes.readUInt32LE(from)
        from = readBlock(bytes, from + HEAD_BYTES, length, all, at)
        at += length
      }
      rmSync(file)
    }
    all.mz.set(own.mz.subarray(0, own.length), at)
    all.intensity.set(own.intensity.subarray(0, own.length), at)
    all.scan.set(own.scan.subarray(0, own.length), at)
    return all
  }

  private makeRoom(slice: number, own: Waiting): void {
    if (own.length >= MOST_WAITING) return this.write(slice, own)
    if (this.room + own.length > MOST_ROOM) this.giveRoomBack()
    if (own.length < own.mz.length) return
    this.room += own.length
    const larger = columns(2 * own.length)
    larger.mz.set(own.mz)
    larger.intensity.set(own.intensity)
    larger.scan.set(own.scan)
    Object.assign(own, larger)
  }

  /** Slices that grew write what waits and begin small again. */
  private giveRoomBack(): void {
    for (const [slice, own] of this.slices) {
      if (own.mz.length === FIRST_POINTS) continue
      this.write(slice, own)
      this.room -= own.mz.length - FIRST_POINTS
      Object.assign(own, columns(FIRST_POINTS))
    }
  }

  private write(slice: number, own: Waiting): void {
    const { length } = own
    if (length === 0) return
    if (own.spilled + length > MOST_SLICE_POINTS) throw new MzmlRefused(`Between m/z ${slice * SLICE_DA} and ${(slice + 1) * SLICE_DA} the file has more than ${wholeNumber(MOST_SLICE_POINTS)} points. Please centroid it first, or keep only points above an intensity.`)
    if (this.points > MOST_POINTS) throw new MzmlRefused(`The file has more than ${wholeNumber(MOST_POINTS)} points. Please centroid it first, or keep only points above an intensity.`)
    const head = Buffer.alloc(HEAD_BYTES)
    head.writeUInt32LE(length)
    appendFileSync(this.file(slice), Buffer.concat([head, ...[own.mz, own.intensity, own.scan].map(values => bytesOf(values.subarray(0, length)))]), { mode: 0o600 })
    own.spilled += length
    own.length = 0
    this.waiting -= length
  }

  private file(slice: number): string {
    return join(this.path, `${slice}.spill`)
  }
}

const columns = (length: number): Centroids => ({ mz: new Float64Array(length), intensity: new Float64Array(length), scan: new Int32Array(length) })

const bytesOf = (values: Float64Array | Int32Array) => Buffer.from(values.buffer, values.byteOffset, values.byteLength)

/** Copies one block to its place; returns where the next begins. */
function readBlock(bytes: Buffer, from: number, length: number, all: Centroids, at: number): number {
  let place = from
  for (const values of [all.mz, all.intensity, all.scan]) {
    const part = bytesOf(values.subarray(at, at + length))
    bytes.copy(part, 0, place, place + part.length)
    place += part.length
  }
  if (place !== from + length * POINT_BYTES) throw new RangeError('A block of points is cut short.')
  return place
}
