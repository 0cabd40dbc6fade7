import type { Clusters } from './clusters'

/** How many of the nearest partners a search keeps, so that a refusal does not need another search. */
const kept = 8

/**
 * For each cluster the partners it may merge with, closest first: centres at most one tolerance apart in each direction, no
 * table in common, all features within tolerance of the new centre. Equal distances go to the first in canonical order.
 * A list stays true while its cluster does not change: partners that merged or closed are passed over, and a cluster made
 * later lists the pair itself.
 */
export class Partners {
  /** The partner at the head of a cluster's list, its squared distance in tolerances. */
  readonly head = { cluster: -1, distance: 0 }
  private cluster = new Int32Array(0)
  private stamp = new Int32Array(0)
  private distance = new Float64Array(0)
  private first = new Int32Array(0)
  private end = new Int32Array(0)

  reset(size: number): void {
    if (this.first.length >= size) return
    const capacity = Math.max(size, 2 * this.first.length)
    this.cluster = new Int32Array(capacity * kept)
    this.stamp = new Int32Array(capacity * kept)
    this.distance = new Float64Array(capacity * kept)
    this.first = new Int32Array(capacity)
    this.end = new Int32Array(capacity)
  }

  /** Lists the partners of a new or changed cluster; the head is left in `head`, −1 where there is none. */
  seek(clusters: Clusters, cluster: number): void {
    this.search(clusters, cluster, -1, -1)
    this.readHead(cluster)
  }

  /** Passes over the head, and what changed since it was listed. */
  advance(clusters: Clusters, cluster: number): void {
    const base = cluster * kept
    let at = this.first[cluster]! + 1
    const end = this.end[cluster]!
    while (at < end && !this.stands(clusters, base + at)) at++
    if (at < end) this.first[cluster] = at
    else if (end < kept) this.first[cluster] = end
    else this.search(clusters, cluster, this.distance[base + kept - 1]!, clusters.rank[this.cluster[base + kept - 1]!]!)
    this.readHead(cluster)
  }

  /** Whether the head of a list is still as it was when listed. */
  headStands(clusters: Clusters, cluster: number): boolean {
    return this.stands(clusters, cluster * kept + this.first[cluster]!)
  }

  private stands(clusters: Clusters, entry: number): boolean {
    const partner = this.cluster[entry]!
    return clusters.open[partner] === 1 && clusters.stamp[partner] === this.stamp[entry]
  }

  private readHead(cluster: number): void {
    const at = cluster * kept + this.first[cluster]!
    const none = this.first[cluster]! >= this.end[cluster]!
    this.head.cluster = none ? -1 : this.cluster[at]!
    this.head.distance = none ? Number.POSITIVE_INFINITY : this.distance[at]!
  }

  /** Fills a list with the nearest partners that come after a given distance and cluster. */
  private search(clusters: Clusters, cluster: number, afterDistance: number, afterRank: number): void {
    this.first[cluster] = 0
    this.end[cluster] = 0
    this.searchAlong(clusters, clusters.next, cluster, afterDistance, afterRank)
    this.searchAlong(clusters, clusters.previous, cluster, afterDistance, afterRank)
  }

  /** Runs outward along the list of clusters and ends where that direction alone is further than the last kept. */
  private searchAlong(clusters: Clusters, step: Int32Array, cluster: number, afterDistance: number, afterRank: number): void {
    const { mz, minutes, massShare, massFloor, minutesTolerance, alongTime } = clusters
    const base = cluster * kept
    const ownMz = mz[cluster]!
    const ownMinutes = minutes[cluster]!
    let worst = this.end[cluster] === kept ? this.distance[base + kept - 1]! : Number.POSITIVE_INFINITY
    for (let other = step[cluster]!; other >= 0; other = step[other]!) {
      const otherMz = mz[other]!
      const byMass = Math.abs(otherMz - ownMz) / Math.max(massShare * 0.5 * (ownMz + otherMz), massFloor)
      const byTime = Math.abs(minutes[other]! - ownMinutes) / minutesTolerance
      const along = alongTime ? byTime : byMass
      if (along > 1 || along * along > worst) break
      if (byMass > 1 || byTime > 1) continue
      const distance = byMass * byMass + byTime * byTime
      if (distance > worst || distance < afterDistance || (distance === afterDistance && clusters.rank[other]! <= afterRank)) continue
      if (clusters.shareTable(cluster, other) || !clusters.fitTogether(cluster, other)) continue
      this.insert(clusters, cluster, other, distance)
      if (this.end[cluster] === kept) worst = this.distance[base + kept - 1]!
    }
  }

  private insert(clusters: Clusters, cluster: number, other: number, distance: number): void {
    const base = cluster * kept
    let at = this.end[cluster]!
    if (at === kept) {
      if (this.after(clusters, base + kept - 1, distance, other)) at--
      else return
    }
    else this.end[cluster] = at + 1
    for (; at > 0 && this.after(clusters, base + at - 1, distance, other); at--) {
      this.cluster[base + at] = this.cluster[base + at - 1]!
      this.stamp[base + at] = this.stamp[base + at - 1]!
      this.distance[base + at] = this.distance[base + at - 1]!
    }
    this.cluster[base + at] = other
    this.stamp[base + at] = clusters.stamp[other]!
    this.distance[base + at] = distance
  }

  /** Whether an entry comes after a partner at this distance. */
  private after(clusters: Clusters, entry: number, distance: number, other: number): boolean {
    const difference = this.distance[entry]! - distance
    return difference > 0 || (difference === 0 && clusters.rank[this.cluster[entry]!]! > clusters.rank[other]!)
  }
}
