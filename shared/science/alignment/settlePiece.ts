import type { Clusters } from './clusters'
import type { ElutionOrder } from './elutionOrder'
import type { MergeQueue } from './mergeQueue'
import { findNearest, refusalKey, type Nearest, type Refusals } from './nearestCluster'
import { markSplitPeaks } from './splitPeaks'

/** What settling a piece works with; made once and used for every piece. */
export interface Bench {
  clusters: Clusters
  queue: MergeQueue
  elution: ElutionOrder
}

/**
 * Settles the piece loaded in `bench.clusters` by agglomeration: again and again the two clusters with the closest centres
 * that may merge do (METHODS 5). First the features that stand alone or are the most intense of their table within
 * tolerance, then the rest. A pair refused for crossing another group stays refused until one of the two changes.
 *
 * @param intensity of each loaded feature
 */
export function settlePiece(bench: Bench, intensity: Float64Array): void {
  const { clusters } = bench
  const lesser = markSplitPeaks(clusters, intensity)
  const first: number[] = []
  const rest: number[] = []
  for (let c = 0; c < clusters.size; c++) (lesser[c] === 1 ? rest : first).push(c)
  const refusals: Refusals = new Set()
  bench.queue.reset(clusters.size)
  for (const entering of [first, rest]) {
    clusters.enlist(entering)
    agglomerate(bench, entering, refusals)
  }
}

function agglomerate({ clusters, queue, elution }: Bench, entering: number[], refusals: Refusals): void {
  const found: Nearest = { cluster: -1, distance: 0 }
  const note = (cluster: number) => {
    findNearest(clusters, cluster, refusals, found)
    queue.set(cluster, found.cluster, found.distance, found.cluster < 0 ? -1 : clusters.stamp[found.cluster]!)
  }
  for (const cluster of entering) note(cluster)
  for (let cluster = queue.first(); cluster >= 0; cluster = queue.first()) {
    const partner = queue.partner[cluster]!
    const stale = clusters.alive[partner] === 0 || clusters.stamp[partner] !== queue.partnerStamp[cluster]
    if (stale || (refusals.size > 0 && refusals.has(refusalKey(clusters, cluster, partner)))) {
      note(cluster)
      continue
    }
    if (elution.wouldCross(clusters, cluster, partner)) {
      refusals.add(refusalKey(clusters, cluster, partner))
      note(cluster)
      continue
    }
    queue.remove(cluster)
    queue.remove(partner)
    note(clusters.merge(cluster, partner))
  }
}
