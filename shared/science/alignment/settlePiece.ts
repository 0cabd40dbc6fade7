import type { Clusters } from './clusters'
import type { ElutionOrder } from './elutionOrder'
import type { MergeQueue } from './mergeQueue'
import type { Partners } from './partners'
import { markSplitPeaks } from './splitPeaks'

/** What settling a piece works with; made once and used for every piece. */
export interface Bench {
  clusters: Clusters
  queue: MergeQueue
  partners: Partners
  elution: ElutionOrder
  /** A cluster refused this often as it stands merges no more: in a crowd of background ions trying on finds nothing. */
  mostRefusals: number
}

/** The default of Bench.mostRefusals. */
export const mostRefusals = 16

/**
 * Settles the piece loaded in `bench.clusters` by agglomeration: again and again the two clusters with the closest centres
 * that may merge do. First the features that stand alone or are the most intense of their table within
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
  bench.queue.reset(clusters.size, clusters.rank)
  bench.partners.reset(clusters.size)
  bench.elution.reset(clusters)
  for (const entering of [first, rest]) {
    clusters.enlist(entering)
    agglomerate(bench, entering)
  }
  clusters.reopen()
}

function agglomerate({ clusters, queue, partners, elution, mostRefusals }: Bench, entering: number[]): void {
  const seek = (cluster: number) => {
    partners.seek(clusters, cluster)
    queue.set(cluster, partners.head.cluster, partners.head.distance)
  }
  const advance = (cluster: number) => {
    partners.advance(clusters, cluster)
    queue.set(cluster, partners.head.cluster, partners.head.distance)
  }
  const refuse = (cluster: number) => {
    if (++clusters.refusals[cluster]! < mostRefusals) return
    clusters.close(cluster)
    queue.remove(cluster)
  }
  // Both clusters of a pair may list it; then it comes up twice, one time right after the other.
  let refusedA = -1
  let refusedB = -1
  for (const cluster of entering) seek(cluster)
  for (let cluster = queue.first(); cluster >= 0; cluster = queue.first()) {
    const partner = queue.partner[cluster]!
    const refusedJustNow = cluster === refusedB && partner === refusedA
    if (refusedJustNow || !partners.headStands(clusters, cluster)) {
      advance(cluster)
      continue
    }
    if (elution.wouldCross(clusters, cluster, partner)) {
      refusedA = cluster
      refusedB = partner
      refuse(cluster)
      refuse(partner)
      if (clusters.open[cluster] === 1) advance(cluster)
      continue
    }
    queue.remove(cluster)
    queue.remove(partner)
    refusedA = refusedB = -1
    const merged = clusters.merge(cluster, partner)
    elution.enter(clusters, merged)
    seek(merged)
  }
}
