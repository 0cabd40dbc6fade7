import { select } from '../numeric/select'
import type { Clusters } from './clusters'

/** Most neighbours kept of a group, the nearest: background ions would have hundreds. */
export const mostNeighbours = 64

/**
 * What the settled pieces leave to be said: groups within tolerance of each other, and features left out of a greater group
 * because a nearer feature of their table stands in it. Only groups of one piece can be so near.
 */
export class NeighbourNotes {
  /** Pairs: group, neighbour; nearest first within a group. */
  readonly group: number[] = []
  readonly neighbour: number[] = []
  /** Features (indices of the stack) left out, and the group each would have joined. */
  readonly leftOutFeature: number[] = []
  readonly leftOutGroup: number[] = []

  /** Reads a settled piece whose clusters became the groups from firstGroup on, in order of their numbers. */
  add(clusters: Clusters, pieceItems: Int32Array, from: number, firstGroup: number): void {
    const groupOf = new Int32Array(clusters.size)
    let group = firstGroup
    for (let c = 0; c < clusters.size; c++) if (clusters.alive[c] === 1) groupOf[c] = group++
    for (let c = 0; c < clusters.size; c++) {
      if (clusters.alive[c] === 0) continue
      const reach = clustersWithin(clusters, c, 2)
      this.addNeighbours(clusters, c, reach, groupOf)
      for (let member = c; member >= 0; member = clusters.nextMember[member]!) {
        const beside = besideWhich(clusters, c, member, reach)
        if (beside < 0) continue
        this.leftOutFeature.push(pieceItems[from + clusters.rank[member]!]!)
        this.leftOutGroup.push(groupOf[beside]!)
      }
    }
  }

  private addNeighbours(clusters: Clusters, cluster: number, reach: number[], groupOf: Int32Array): void {
    for (const other of nearestOf(clusters, cluster, reach)) {
      this.group.push(groupOf[cluster]!)
      this.neighbour.push(groupOf[other]!)
    }
  }
}

/** Those within one tolerance of a cluster's centre, nearest first, at most `mostNeighbours`. */
function nearestOf(clusters: Clusters, cluster: number, reach: readonly number[]): number[] {
  const mz = clusters.mz[cluster]!
  const minutes = clusters.minutes[cluster]!
  const distances = Float64Array.from(reach, other => squaredDistance(clusters, mz, minutes, other, 1))
  const furthest = reach.length > mostNeighbours ? select(distances.slice(), mostNeighbours - 1) : Number.MAX_VALUE
  const near: number[] = []
  for (let i = 0; i < reach.length; i++) if (distances[i]! <= furthest && distances[i]! < Number.POSITIVE_INFINITY) near.push(i)
  near.sort((a, b) => distances[a]! - distances[b]! || clusters.rank[reach[a]!]! - clusters.rank[reach[b]!]!)
  return near.slice(0, mostNeighbours).map(i => reach[i]!)
}

/** Squared distance in tolerances from a point to a cluster's centre; Infinity where either direction exceeds `limit` tolerances. */
function squaredDistance(clusters: Clusters, mz: number, minutes: number, cluster: number, limit: number): number {
  const byMass = Math.abs(clusters.mz[cluster]! - mz) / clusters.massTolerance(clusters.mz[cluster]!)
  const byTime = Math.abs(clusters.minutes[cluster]! - minutes) / clusters.minutesTolerance
  return byMass > limit || byTime > limit ? Number.POSITIVE_INFINITY : byMass * byMass + byTime * byTime
}

function clustersWithin(clusters: Clusters, cluster: number, limit: number): number[] {
  const within: number[] = []
  const mz = clusters.mz[cluster]!
  const minutes = clusters.minutes[cluster]!
  const far = limit * (clusters.alongTime ? clusters.minutesTolerance : clusters.massTolerance(mz) * 1.001)
  for (const step of [clusters.next, clusters.previous]) {
    for (let other = step[cluster]!; other >= 0; other = step[other]!) {
      if (Math.abs(clusters.place(other) - clusters.place(cluster)) > far) break
      if (squaredDistance(clusters, mz, minutes, other, limit) < Number.POSITIVE_INFINITY) within.push(other)
    }
  }
  return within
}

/** The nearest greater cluster that a feature lies within tolerance of and that holds a nearer feature of its table; −1: none. */
function besideWhich(clusters: Clusters, own: number, feature: number, reach: number[]): number {
  let beside = -1
  let best = Number.POSITIVE_INFINITY
  for (const other of reach) {
    if (clusters.count[other]! <= clusters.count[own]! || !clusters.holdsTable(other, clusters.table[feature]!)) continue
    const distance = squaredDistance(clusters, clusters.featureMz[feature]!, clusters.featureMinutes[feature]!, other, 1)
    if (distance > best || (distance === best && clusters.rank[other]! > clusters.rank[beside]!) || distance === Number.POSITIVE_INFINITY) continue
    if (memberDistance(clusters, other, clusters.table[feature]!) >= distance) continue
    best = distance
    beside = other
  }
  return beside
}

function memberDistance(clusters: Clusters, cluster: number, table: number): number {
  for (let member = cluster; member >= 0; member = clusters.nextMember[member]!) {
    if (clusters.table[member] !== table) continue
    return squaredDistance(clusters, clusters.featureMz[member]!, clusters.featureMinutes[member]!, cluster, 2)
  }
  return Number.POSITIVE_INFINITY
}
