import type { Clusters } from './clusters'

/** The partner a cluster would merge with, and the squared distance to it in tolerances; −1 and Infinity where there is none. */
export interface Nearest {
  cluster: number
  distance: number
}

/** Pairs refused because they would cross another group, by the stamps of both states. */
export type Refusals = Set<number>

export function refusalKey(clusters: Clusters, a: number, b: number): number {
  const one = clusters.stamp[a]!
  const other = clusters.stamp[b]!
  return Math.min(one, other) * 0x4000000 + Math.max(one, other)
}

/**
 * Finds the closest cluster that a cluster may merge with: centres at most one tolerance apart in each direction, no table in
 * common, all features within tolerance of the new centre, not refused. Equal distances go to the first in canonical order.
 * The search runs outward along the list and ends where that direction alone is further than the best found.
 */
export function findNearest(clusters: Clusters, cluster: number, refusals: Refusals, found: Nearest): void {
  found.cluster = -1
  found.distance = Number.POSITIVE_INFINITY
  searchAlong(clusters, clusters.next, cluster, refusals, found)
  searchAlong(clusters, clusters.previous, cluster, refusals, found)
}

function searchAlong(clusters: Clusters, step: Int32Array, cluster: number, refusals: Refusals, found: Nearest): void {
  const { mz, minutes, massShare, massFloor, minutesTolerance, alongTime } = clusters
  const ownMz = mz[cluster]!
  const ownMinutes = minutes[cluster]!
  let best = found.distance
  for (let other = step[cluster]!; other >= 0; other = step[other]!) {
    const otherMz = mz[other]!
    const byMass = Math.abs(otherMz - ownMz) / Math.max(massShare * 0.5 * (ownMz + otherMz), massFloor)
    const byTime = Math.abs(minutes[other]! - ownMinutes) / minutesTolerance
    const along = alongTime ? byTime : byMass
    if (along > 1 || along * along > best) break
    if (byMass > 1 || byTime > 1) continue
    const distance = byMass * byMass + byTime * byTime
    if (distance > best || (distance === best && other > found.cluster)) continue
    if (clusters.shareTable(cluster, other) || !clusters.fitTogether(cluster, other)) continue
    if (refusals.size > 0 && refusals.has(refusalKey(clusters, cluster, other))) continue
    best = distance
    found.cluster = other
    found.distance = distance
  }
}
