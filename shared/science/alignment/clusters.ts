import { massFloorDa } from '../mass/tolerance'
import { ascendingOrder } from '../numeric/ascendingOrder'
import type { AlignmentSettings } from './settings'

const none = -1

/**
 * The clusters of one crowded piece while it is settled. Each feature starts as a cluster of its own; a cluster is named
 * by its first feature in canonical order. Features are numbered along the list, so that those near each other lie close
 * in memory. Held in typed arrays that are used again for the next piece.
 */
export class Clusters {
  readonly massShare: number
  readonly massFloor: number
  readonly minutesTolerance: number
  /** 32-bit words that mark which tables a cluster holds. */
  readonly tableWords: number
  size = 0
  /** Whether the list runs along time or along m/z: along whichever spreads over more tolerances. */
  alongTime = true

  // Per feature.
  /** Its place in the piece's canonical order, which settles ties. */
  rank = new Int32Array(0)
  featureMz = new Float64Array(0)
  featureMinutes = new Float64Array(0)
  table = new Int32Array(0)
  nextMember = new Int32Array(0)

  // Per cluster.
  mz = new Float64Array(0)
  minutes = new Float64Array(0)
  sumMz = new Float64Array(0)
  sumMinutes = new Float64Array(0)
  lowMz = new Float64Array(0)
  highMz = new Float64Array(0)
  lowMinutes = new Float64Array(0)
  highMinutes = new Float64Array(0)
  count = new Int32Array(0)
  lastMember = new Int32Array(0)
  tableMarks = new Int32Array(0)
  /** Changes with every merge, so that what was found about an older state is not taken for the new one. */
  stamp = new Int32Array(0)
  /** 1 for a cluster, 0 for what merged into another. */
  alive = new Uint8Array(0)
  /** 1 while a cluster may still merge. */
  open = new Uint8Array(0)
  /** How often merges of the cluster as it stands were refused. */
  refusals = new Int32Array(0)
  next = new Int32Array(0)
  previous = new Int32Array(0)
  first = none
  private stamps = 0

  constructor(settings: AlignmentSettings, tables: number) {
    this.massShare = settings.alignMassPpm * 1e-6
    this.massFloor = settings.massFloorDa ?? massFloorDa(settings.alignMassPpm)
    this.minutesTolerance = settings.retentionMinutes
    this.tableWords = Math.max(1, Math.ceil(tables / 32))
  }

  /** Takes the features items[from … to], in canonical order, each as a cluster; none is open yet. */
  load(mz: Float64Array, minutes: Float64Array, table: Int32Array, items: Int32Array, from: number, to: number): void {
    const size = to - from
    this.size = size
    if (this.mz.length < size) this.grow(Math.max(size, 2 * this.mz.length, 256))
    this.tableMarks.fill(0, 0, size * this.tableWords)
    this.first = none
    const order = this.orderAlong(mz, minutes, items.subarray(from, to))
    for (let c = 0; c < size; c++) {
      const feature = items[from + order[c]!]!
      const home = table[feature]!
      this.featureMz[c] = this.mz[c] = this.sumMz[c] = this.lowMz[c] = this.highMz[c] = mz[feature]!
      this.featureMinutes[c] = this.minutes[c] = this.sumMinutes[c] = this.lowMinutes[c] = this.highMinutes[c] = minutes[feature]!
      this.table[c] = home
      this.tableMarks[c * this.tableWords + (home >>> 5)] = 1 << (home & 31)
      this.rank[c] = order[c]!
      this.count[c] = 1
      this.nextMember[c] = none
      this.lastMember[c] = c
      this.stamp[c] = c
      this.alive[c] = 1
      this.open[c] = 0
      this.refusals[c] = 0
    }
    this.stamps = size
  }

  /** Chooses the direction of the list and gives the features' order along it; those at one place in canonical order. */
  private orderAlong(mz: Float64Array, minutes: Float64Array, items: Int32Array): Int32Array {
    const times = Float64Array.from(items, feature => minutes[feature]!)
    const masses = Float64Array.from(items, feature => mz[feature]!)
    let earliest = Number.POSITIVE_INFINITY
    let latest = Number.NEGATIVE_INFINITY
    for (const time of times) {
      if (time < earliest) earliest = time
      if (time > latest) latest = time
    }
    const massSpread = (masses[masses.length - 1]! - masses[0]!) / this.massTolerance(masses[0]!)
    this.alongTime = (latest - earliest) / this.minutesTolerance >= massSpread
    return ascendingOrder(this.alongTime ? times : masses)
  }

  massTolerance(mz: number): number {
    return Math.max(this.massShare * mz, this.massFloor)
  }

  /** Where a cluster stands along the list. */
  place(cluster: number): number {
    return this.alongTime ? this.minutes[cluster]! : this.mz[cluster]!
  }

  /**
   * Opens clusters to merging: puts them into the list beside those already there.
   *
   * @param entering in order along the list
   */
  enlist(entering: readonly number[]): void {
    let at = this.first
    let before = none
    for (const cluster of entering) {
      while (at !== none && this.place(at) <= this.place(cluster)) {
        before = at
        at = this.next[at]!
      }
      this.open[cluster] = 1
      this.previous[cluster] = before
      this.next[cluster] = at
      if (before === none) this.first = cluster
      else this.next[before] = cluster
      if (at !== none) this.previous[at] = cluster
      before = cluster
    }
  }

  /** Puts closed clusters back, so that the list holds all. */
  reopen(): void {
    const closed: number[] = []
    for (let c = 0; c < this.size; c++) if (this.alive[c] === 1 && this.open[c] === 0) closed.push(c)
    this.enlist(closed.sort((a, b) => this.place(a) - this.place(b) || a - b))
  }

  shareTable(a: number, b: number): boolean {
    const words = this.tableWords
    for (let w = 0; w < words; w++) if ((this.tableMarks[a * words + w]! & this.tableMarks[b * words + w]!) !== 0) return true
    return false
  }

  holdsTable(cluster: number, table: number): boolean {
    return (this.tableMarks[cluster * this.tableWords + (table >>> 5)]! & (1 << (table & 31))) !== 0
  }

  /** Whether every feature of both would lie within tolerance of their common centre. */
  fitTogether(a: number, b: number): boolean {
    const count = this.count[a]! + this.count[b]!
    const minutes = (this.sumMinutes[a]! + this.sumMinutes[b]!) / count
    const lowMinutes = Math.min(this.lowMinutes[a]!, this.lowMinutes[b]!)
    const highMinutes = Math.max(this.highMinutes[a]!, this.highMinutes[b]!)
    if (highMinutes - minutes > this.minutesTolerance || minutes - lowMinutes > this.minutesTolerance) return false
    const mz = (this.sumMz[a]! + this.sumMz[b]!) / count
    const tolerance = this.massTolerance(mz)
    return Math.max(this.highMz[a]!, this.highMz[b]!) - mz <= tolerance && mz - Math.min(this.lowMz[a]!, this.lowMz[b]!) <= tolerance
  }

  /** Joins two clusters under the name of the first in canonical order, which is returned. */
  merge(a: number, b: number): number {
    const kept = this.rank[a]! < this.rank[b]! ? a : b
    const gone = kept === a ? b : a
    this.sumMz[kept] = this.sumMz[kept]! + this.sumMz[gone]!
    this.sumMinutes[kept] = this.sumMinutes[kept]! + this.sumMinutes[gone]!
    this.count[kept] = this.count[kept]! + this.count[gone]!
    this.mz[kept] = this.sumMz[kept]! / this.count[kept]!
    this.minutes[kept] = this.sumMinutes[kept]! / this.count[kept]!
    this.lowMz[kept] = Math.min(this.lowMz[kept]!, this.lowMz[gone]!)
    this.highMz[kept] = Math.max(this.highMz[kept]!, this.highMz[gone]!)
    this.lowMinutes[kept] = Math.min(this.lowMinutes[kept]!, this.lowMinutes[gone]!)
    this.highMinutes[kept] = Math.max(this.highMinutes[kept]!, this.highMinutes[gone]!)
    const words = this.tableWords
    for (let w = 0; w < words; w++) this.tableMarks[kept * words + w]! |= this.tableMarks[gone * words + w]!
    this.nextMember[this.lastMember[kept]!] = gone
    this.lastMember[kept] = this.lastMember[gone]!
    this.stamp[kept] = this.stamps++
    this.refusals[kept] = 0
    this.alive[gone] = 0
    this.close(gone)
    this.relocate(kept)
    return kept
  }

  /** Takes a cluster out of the list: it will not merge any more. */
  close(cluster: number): void {
    this.open[cluster] = 0
    this.unlink(cluster)
  }

  private unlink(cluster: number): void {
    const before = this.previous[cluster]!
    const after = this.next[cluster]!
    if (before === none) this.first = after
    else this.next[before] = after
    if (after !== none) this.previous[after] = before
  }

  /** Moves a cluster along the list to where its new centre belongs. */
  private relocate(cluster: number): void {
    const place = this.place(cluster)
    let before = this.previous[cluster]!
    let after = this.next[cluster]!
    if ((before === none || this.place(before) <= place) && (after === none || this.place(after) >= place)) return
    this.unlink(cluster)
    while (before !== none && this.place(before) > place) {
      after = before
      before = this.previous[before]!
    }
    while (after !== none && this.place(after) < place) {
      before = after
      after = this.next[after]!
    }
    this.previous[cluster] = before
    this.next[cluster] = after
    if (before === none) this.first = cluster
    else this.next[before] = cluster
    if (after !== none) this.previous[after] = cluster
  }

  private grow(capacity: number): void {
    for (const name of ['featureMz', 'featureMinutes', 'mz', 'minutes', 'sumMz', 'sumMinutes', 'lowMz', 'highMz', 'lowMinutes', 'highMinutes'] as const) {
      this[name] = new Float64Array(capacity)
    }
    for (const name of ['rank', 'table', 'nextMember', 'count', 'lastMember', 'stamp', 'refusals', 'next', 'previous'] as const) this[name] = new Int32Array(capacity)
    this.tableMarks = new Int32Array(capacity * this.tableWords)
    this.alive = new Uint8Array(capacity)
    this.open = new Uint8Array(capacity)
  }
}
