import type { Clusters } from './clusters'

/** Cells of the time axis, as a share of the retention tolerance. */
const cellShare = 0.25

/**
 * Says whether a merge would cross another group: at the same m/z, a feature of one group before the other's in one table
 * and after it in another table. Features of the same m/z keep their order of elution.
 * Groups of two and more stand in every cell of time they reach over, so that only those that overlap are looked at.
 */
export class ElutionOrder {
  private readonly minutesOfTable: Float64Array
  private readonly markOfTable: Int32Array
  private mark = 0
  private start = 0
  private cellMinutes = 1
  private cellHead = new Int32Array(0)
  private entryNext = new Int32Array(256)
  private entryCluster = new Int32Array(256)
  private entries = 0
  private visited = new Int32Array(0)
  private visit = 0

  constructor(tables: number) {
    this.minutesOfTable = new Float64Array(tables)
    this.markOfTable = new Int32Array(tables)
  }

  /** Empties the cells for a newly loaded piece. */
  reset(clusters: Clusters): void {
    let earliest = Number.POSITIVE_INFINITY
    let latest = Number.NEGATIVE_INFINITY
    for (let c = 0; c < clusters.size; c++) {
      earliest = Math.min(earliest, clusters.minutes[c]!)
      latest = Math.max(latest, clusters.minutes[c]!)
    }
    this.start = earliest
    this.cellMinutes = cellShare * clusters.minutesTolerance
    const cells = Math.floor((latest - earliest) / this.cellMinutes) + 1
    if (this.cellHead.length < cells) this.cellHead = new Int32Array(2 * cells)
    this.cellHead.fill(-1, 0, cells)
    this.entries = 0
    if (this.visited.length < clusters.size) this.visited = new Int32Array(2 * clusters.size)
  }

  /** Enters a merged cluster into the cells it reaches over; what merged into it falls out by itself. */
  enter(clusters: Clusters, cluster: number): void {
    const last = this.cell(clusters.highMinutes[cluster]!)
    for (let cell = this.cell(clusters.lowMinutes[cluster]!); cell <= last; cell++) {
      if (this.entries === this.entryNext.length) this.growEntries()
      this.entryCluster[this.entries] = cluster
      this.entryNext[this.entries] = this.cellHead[cell]!
      this.cellHead[cell] = this.entries++
    }
  }

  wouldCross(clusters: Clusters, a: number, b: number): boolean {
    const count = clusters.count[a]! + clusters.count[b]!
    const mz = (clusters.sumMz[a]! + clusters.sumMz[b]!) / count
    const tolerance = clusters.massTolerance(mz)
    const low = Math.min(clusters.lowMinutes[a]!, clusters.lowMinutes[b]!)
    const high = Math.max(clusters.highMinutes[a]!, clusters.highMinutes[b]!)
    const visit = ++this.visit
    this.visited[a] = visit
    this.visited[b] = visit
    let marked = false
    const last = this.cell(high)
    for (let cell = this.cell(low); cell <= last; cell++) {
      let before = -1
      for (let entry = this.cellHead[cell]!; entry >= 0; entry = this.entryNext[entry]!) {
        const other = this.entryCluster[entry]!
        if (clusters.alive[other] === 0) {
          if (before < 0) this.cellHead[cell] = this.entryNext[entry]!
          else this.entryNext[before] = this.entryNext[entry]!
          continue
        }
        before = entry
        if (this.visited[other] === visit) continue
        this.visited[other] = visit
        if (clusters.lowMinutes[other]! >= high || clusters.highMinutes[other]! <= low) continue
        if (Math.abs(clusters.mz[other]! - mz) > tolerance) continue
        if (!clusters.shareTable(a, other) || !clusters.shareTable(b, other)) continue
        if (!marked) this.markTables(clusters, a, b)
        marked = true
        if (this.crosses(clusters, other)) return true
      }
    }
    return false
  }

  private cell(minutes: number): number {
    return Math.floor((minutes - this.start) / this.cellMinutes)
  }

  private markTables(clusters: Clusters, a: number, b: number): void {
    this.mark++
    for (const cluster of [a, b]) {
      for (let member = cluster; member >= 0; member = clusters.nextMember[member]!) {
        this.minutesOfTable[clusters.table[member]!] = clusters.featureMinutes[member]!
        this.markOfTable[clusters.table[member]!] = this.mark
      }
    }
  }

  private crosses(clusters: Clusters, other: number): boolean {
    let before = false
    let after = false
    for (let member = other; member >= 0; member = clusters.nextMember[member]!) {
      const table = clusters.table[member]!
      if (this.markOfTable[table] !== this.mark) continue
      const difference = clusters.featureMinutes[member]! - this.minutesOfTable[table]!
      if (difference > 0) after = true
      else if (difference < 0) before = true
      if (before && after) return true
    }
    return false
  }

  private growEntries(): void {
    const next = new Int32Array(2 * this.entries)
    const cluster = new Int32Array(2 * this.entries)
    next.set(this.entryNext)
    cluster.set(this.entryCluster)
    this.entryNext = next
    this.entryCluster = cluster
  }
}
