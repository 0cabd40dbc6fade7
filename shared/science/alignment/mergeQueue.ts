/**
 * Clusters by the distance to their nearest partner, closest first: an indexed binary heap.
 * Equal distances: the pair whose first, then second cluster comes earlier in canonical order.
 */
export class MergeQueue {
  length = 0
  partner = new Int32Array(0)
  distance = new Float64Array(0)
  private rank: Int32Array = new Int32Array(0)
  private heap = new Int32Array(0)
  private slot = new Int32Array(0)

  /**
   * Empties the queue for clusters 0 … size − 1.
   *
   * @param rank place of each in canonical order
   */
  reset(size: number, rank: Int32Array): void {
    this.rank = rank
    if (this.partner.length < size) {
      const capacity = Math.max(size, 2 * this.partner.length)
      this.partner = new Int32Array(capacity)
      this.distance = new Float64Array(capacity)
      this.heap = new Int32Array(capacity)
      this.slot = new Int32Array(capacity)
    }
    this.slot.fill(-1, 0, size)
    this.length = 0
  }

  /** The cluster whose partner is closest; −1 where the queue is empty. */
  first(): number {
    return this.length > 0 ? this.heap[0]! : -1
  }

  /** Enters, moves or (partner −1) removes a cluster. */
  set(cluster: number, partner: number, distance: number): void {
    if (partner < 0) {
      this.remove(cluster)
      return
    }
    this.partner[cluster] = partner
    this.distance[cluster] = distance
    if (this.slot[cluster]! < 0) {
      this.heap[this.length] = cluster
      this.slot[cluster] = this.length++
    }
    this.settle(this.slot[cluster]!)
  }

  remove(cluster: number): void {
    const slot = this.slot[cluster]!
    if (slot < 0) return
    this.slot[cluster] = -1
    const last = this.heap[--this.length]!
    if (last === cluster) return
    this.heap[slot] = last
    this.slot[last] = slot
    this.settle(slot)
  }

  private before(a: number, b: number): boolean {
    const difference = this.distance[a]! - this.distance[b]!
    if (difference !== 0) return difference < 0
    const ownA = this.rank[a]!
    const ownB = this.rank[b]!
    const partnerA = this.rank[this.partner[a]!]!
    const partnerB = this.rank[this.partner[b]!]!
    const first = Math.min(ownA, partnerA) - Math.min(ownB, partnerB)
    if (first !== 0) return first < 0
    const second = Math.max(ownA, partnerA) - Math.max(ownB, partnerB)
    return second !== 0 ? second < 0 : ownA < ownB
  }

  private settle(start: number): void {
    const { heap, slot } = this
    const cluster = heap[start]!
    let at = start
    while (at > 0) {
      const parent = (at - 1) >> 1
      if (!this.before(cluster, heap[parent]!)) break
      heap[at] = heap[parent]!
      slot[heap[at]!] = at
      at = parent
    }
    for (;;) {
      let child = 2 * at + 1
      if (child >= this.length) break
      if (child + 1 < this.length && this.before(heap[child + 1]!, heap[child]!)) child++
      if (!this.before(heap[child]!, cluster)) break
      heap[at] = heap[child]!
      slot[heap[at]!] = at
      at = child
    }
    heap[at] = cluster
    slot[cluster] = at
  }
}
