import { ascendingOrder } from '../numeric/ascendingOrder'
import { massFloorDa, massToleranceDa } from '../mass/tolerance'
import { Clusters } from './clusters'
import { ElutionOrder } from './elutionOrder'
import { MergeQueue } from './mergeQueue'
import { NeighbourNotes } from './neighbours'
import { Partners } from './partners'
import type { AlignmentSettings } from './settings'
import { mostRefusals, settlePiece, type Bench } from './settlePiece'
import { splitOnGaps, type Pieces } from './splitOnGaps'
import type { FeatureStack } from './stack'

/** Groups in the order they were found: the features of group g are items[starts[g] … starts[g + 1]], in canonical order. */
export interface Groups {
  items: Int32Array
  starts: Int32Array
  groups: number
}

export interface Correspondence extends Groups {
  crowdedPieces: number
  notes: NeighbourNotes
}

/** The pieces of a stack, and which of them are groups as they stand. */
export interface SortedPieces extends Pieces {
  /** 1 for a piece that must be settled. */
  crowded: Uint8Array
  crowdedPieces: number
}

/** First step of grouping: a piece with one feature a table, all within tolerance of its centre, is a group. */
export function sortPieces(stack: FeatureStack, minutes: Float64Array, settings: AlignmentSettings): SortedPieces {
  const pieces = splitOnGaps(stack.mz, minutes, ascendingOrder(minutes), settings)
  const { items, starts } = pieces
  const count = starts.length - 1
  const crowded = new Uint8Array(count)
  const seenInPiece = new Int32Array(stack.inputPosition.length).fill(-1)
  let crowdedPieces = 0
  for (let piece = 0; piece < count; piece++) {
    const from = starts[piece]!
    const to = starts[piece + 1]!
    if (to - from > 1 && !isGroup(stack, minutes, items, from, to, settings, seenInPiece, piece)) {
      crowded[piece] = 1
      crowdedPieces++
    }
  }
  return { items, starts, crowded, crowdedPieces }
}

function isGroup(
  stack: FeatureStack, minutes: Float64Array, items: Int32Array, from: number, to: number,
  settings: AlignmentSettings, seenInPiece: Int32Array, piece: number,
): boolean {
  const { mz, table } = stack
  let sumMz = 0
  let sumMinutes = 0
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (let i = from; i < to; i++) {
    const item = items[i]!
    if (seenInPiece[table[item]!] === piece) return false
    seenInPiece[table[item]!] = piece
    sumMz += mz[item]!
    const at = minutes[item]!
    sumMinutes += at
    if (at < low) low = at
    if (at > high) high = at
  }
  const centreMz = sumMz / (to - from)
  const centre = sumMinutes / (to - from)
  const tolerance = massToleranceDa(centreMz, settings.alignMassPpm, settings.massFloorDa ?? massFloorDa(settings.alignMassPpm))
  return high - centre <= settings.retentionMinutes && centre - low <= settings.retentionMinutes
    && mz[items[to - 1]!]! - centreMz <= tolerance && centreMz - mz[items[from]!]! <= tolerance
}

/** The groups that splitting alone made: the surest. Pieces of one feature and crowded ones are left out. */
export function certainGroups({ items, starts, crowded }: SortedPieces): Groups {
  const kept = new Int32Array(items.length)
  const keptStarts = new Int32Array(starts.length)
  let groups = 0
  let at = 0
  for (let piece = 0; piece + 1 < starts.length; piece++) {
    const from = starts[piece]!
    const to = starts[piece + 1]!
    if (crowded[piece] === 1 || to - from < 2) continue
    keptStarts[groups++] = at
    for (let i = from; i < to; i++) kept[at++] = items[i]!
  }
  keptStarts[groups] = at
  return { items: kept.slice(0, at), starts: keptStarts.slice(0, groups + 1), groups }
}

/** Second step of grouping: settles the crowded pieces and lists all groups. */
export function settlePieces(
  stack: FeatureStack, minutes: Float64Array, pieces: SortedPieces, settings: AlignmentSettings, onShare: (share: number) => void,
): Correspondence {
  const tables = stack.inputPosition.length
  const bench: Bench = { clusters: new Clusters(settings, tables), queue: new MergeQueue(), partners: new Partners(), elution: new ElutionOrder(tables), mostRefusals }
  const items = pieces.items.slice()
  const starts = new Int32Array(stack.size + 1)
  const notes = new NeighbourNotes()
  let groups = 0
  for (let piece = 0; piece + 1 < pieces.starts.length; piece++) {
    const from = pieces.starts[piece]!
    const to = pieces.starts[piece + 1]!
    if ((piece & 0xfff) === 0) onShare(from / stack.size)
    if (pieces.crowded[piece] === 0) {
      starts[groups++] = from
      continue
    }
    bench.clusters.load(stack.mz, minutes, stack.table, pieces.items, from, to)
    settlePiece(bench, intensities(stack, bench.clusters, pieces.items, from))
    const firstGroup = groups
    groups = writeGroups(bench.clusters, pieces.items, from, items, starts, groups)
    if (groups - firstGroup > 1) notes.add(bench.clusters, pieces.items, from, firstGroup)
  }
  starts[groups] = stack.size
  return { items, starts: starts.slice(0, groups + 1), groups, crowdedPieces: pieces.crowdedPieces, notes }
}

function intensities(stack: FeatureStack, { size, rank }: Clusters, items: Int32Array, from: number): Float64Array {
  const values = new Float64Array(size)
  for (let feature = 0; feature < size; feature++) values[feature] = stack.intensity[items[from + rank[feature]!]!]!
  return values
}

/** Writes the clusters of a settled piece, in order along its list, over the piece's place in `items`. */
function writeGroups(clusters: Clusters, pieceItems: Int32Array, from: number, items: Int32Array, starts: Int32Array, firstGroup: number): number {
  let groups = firstGroup
  let at = from
  for (let cluster = 0; cluster < clusters.size; cluster++) {
    if (clusters.alive[cluster] === 0) continue
    const start = at
    starts[groups++] = start
    for (let member = cluster; member >= 0; member = clusters.nextMember[member]!) items[at++] = pieceItems[from + clusters.rank[member]!]!
    items.subarray(start, at).sort()
  }
  return groups
}
