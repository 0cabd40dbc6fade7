import { massFloorDa } from '../mass/tolerance'
import type { AlignmentSettings } from './settings'

/** Features cut into pieces: those of piece p are items[starts[p] … starts[p + 1]], ascending. */
export interface Pieces {
  items: Int32Array
  starts: Int32Array
}

/** Pieces shorter than this are put in order by insertion, which beats a call to the engine's sort. */
const insertionLength = 24

/**
 * Cuts features where neighbours in m/z lie further apart than the tolerance, the parts where neighbours in time do, and
 * so in turn until nothing splits. Two features within both tolerances always stay in one piece.
 *
 * @param mz ascending; a feature is its index
 * @param minutes corrected minutes of each
 * @param timeOrder features in ascending order of minutes
 */
export function splitOnGaps(mz: Float64Array, minutes: Float64Array, timeOrder: Int32Array, settings: AlignmentSettings): Pieces {
  const size = mz.length
  const massShare = settings.alignMassPpm * 1e-6
  const massFloor = settings.massFloorDa ?? massFloorDa(settings.alignMassPpm)
  const timeRank = new Int32Array(size)
  for (let rank = 0; rank < size; rank++) timeRank[timeOrder[rank]!] = rank
  // Features are held as indices, which are in order of m/z, or as ranks in time: either way sorting whole numbers is enough.
  const items = new Int32Array(size)
  for (let i = 0; i < size; i++) items[i] = i
  const starts: number[] = []
  const waiting: number[] = []

  const cutByMass = (from: number, to: number) => {
    let start = from
    for (let i = from + 1; i <= to; i++) {
      if (i < to) {
        const value = mz[items[i]!]!
        if (value - mz[items[i - 1]!]! <= Math.max(massShare * value, massFloor)) continue
      }
      waiting.push(start, i, 1)
      start = i
    }
  }
  const cutByTime = (from: number, to: number) => {
    let start = from
    for (let i = from + 1; i <= to; i++) {
      if (i < to && minutes[timeOrder[items[i]!]!]! - minutes[timeOrder[items[i - 1]!]!]! <= settings.retentionMinutes) continue
      waiting.push(start, i, 0)
      start = i
    }
  }

  if (size > 0) cutByMass(0, size)
  while (waiting.length > 0) {
    const byTime = waiting.pop() === 1
    const to = waiting.pop()!
    const from = waiting.pop()!
    if (to - from === 1) {
      if (!byTime) items[from] = timeOrder[items[from]!]!
      starts.push(from)
      continue
    }
    const recode = byTime ? timeRank : timeOrder
    for (let i = from; i < to; i++) items[i] = recode[items[i]!]!
    sortWhole(items, from, to)
    const before = waiting.length
    if (byTime) cutByTime(from, to)
    else cutByMass(from, to)
    // One part, cut by neither: a piece.
    if (waiting.length - before === 3) {
      waiting.length = before
      starts.push(from)
      if (byTime) {
        for (let i = from; i < to; i++) items[i] = timeOrder[items[i]!]!
        sortWhole(items, from, to)
      }
    }
  }
  const sorted = Int32Array.from(starts).sort()
  const bounds = new Int32Array(sorted.length + 1)
  bounds.set(sorted)
  bounds[sorted.length] = size
  return { items, starts: bounds }
}

function sortWhole(items: Int32Array, from: number, to: number): void {
  if (to - from > insertionLength) {
    items.subarray(from, to).sort()
    return
  }
  for (let i = from + 1; i < to; i++) {
    const value = items[i]!
    let j = i - 1
    for (; j >= from && items[j]! > value; j--) items[j + 1] = items[j]!
    items[j + 1] = value
  }
}
