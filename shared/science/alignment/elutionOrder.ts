import type { Clusters } from './clusters'

/**
 * Says whether a merge would cross another group: at the same m/z, a feature of one group before the other's in one table
 * and after it in another table. Features of the same m/z keep their order of elution.
 */
export class ElutionOrder {
  private readonly minutesOfTable: Float64Array
  private readonly markOfTable: Int32Array
  private mark = 0

  constructor(tables: number) {
    this.minutesOfTable = new Float64Array(tables)
    this.markOfTable = new Int32Array(tables)
  }

  wouldCross(clusters: Clusters, a: number, b: number): boolean {
    const count = clusters.count[a]! + clusters.count[b]!
    const mz = (clusters.sumMz[a]! + clusters.sumMz[b]!) / count
    const tolerance = clusters.massTolerance(mz)
    const low = Math.min(clusters.lowMinutes[a]!, clusters.lowMinutes[b]!)
    const high = Math.max(clusters.highMinutes[a]!, clusters.highMinutes[b]!)
    const reach = clusters.widestMinutes
    let marked = false
    for (const step of [clusters.next, clusters.previous]) {
      for (let other = step[a]!; other >= 0; other = step[other]!) {
        if (clusters.alongTime) {
          const minutes = clusters.minutes[other]!
          if (minutes > high + reach || minutes < low - reach) break
          if (Math.abs(clusters.mz[other]! - mz) > tolerance) continue
        }
        else if (Math.abs(clusters.mz[other]! - mz) > tolerance) {
          // Between the centre of a and the common centre the list may still come nearer.
          if (Math.abs(clusters.mz[other]! - clusters.mz[a]!) > 2 * tolerance) break
          continue
        }
        if (clusters.count[other]! < 2 || other === b) continue
        if (clusters.lowMinutes[other]! >= high || clusters.highMinutes[other]! <= low) continue
        if (!clusters.shareTable(a, other) || !clusters.shareTable(b, other)) continue
        if (!marked) {
          this.markTables(clusters, a, b)
          marked = true
        }
        if (this.crosses(clusters, other)) return true
      }
    }
    return false
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
}
