import { massToleranceDa } from '../../shared/science/mass/tolerance'
import type { AlignmentSettings } from '../../shared/science/alignment/settings'

export interface PlainFeature {
  mz: number
  minutes: number
  intensity: number
  table: number
}

interface PlainCluster {
  members: number[]
  sumMz: number
  sumMinutes: number
  stamp: number
  refusals: number
}

/**
 * The second step of grouping, by trying every pair at every step: the oracle for the fast one. Features in canonical order.
 *
 * @returns groups as lists of features, each ascending
 */
export function bruteAgglomeration(features: readonly PlainFeature[], settings: AlignmentSettings, mostRefusals: number): number[][] {
  const tolerance = (mz: number) => massToleranceDa(mz, settings.alignMassPpm, settings.massFloorDa)
  const at = (index: number) => features[index] as PlainFeature
  const lesser = features.map((own, i) => features.some((other, j) => j !== i && other.table === own.table
    && Math.abs(other.minutes - own.minutes) <= settings.retentionMinutes
    && Math.abs(other.mz - own.mz) <= tolerance(0.5 * (other.mz + own.mz))
    && (other.intensity > own.intensity || (other.intensity === own.intensity && j < i))))
  let stamps = 0
  const single = (index: number): PlainCluster => ({ members: [index], sumMz: at(index).mz, sumMinutes: at(index).minutes, stamp: stamps++, refusals: 0 })
  const refused = new Set<string>()
  let clusters: PlainCluster[] = []

  const distance = (a: PlainCluster, b: PlainCluster): number => {
    const [mzA, mzB] = [a.sumMz / a.members.length, b.sumMz / b.members.length]
    const byMass = Math.abs(mzA - mzB) / tolerance(0.5 * (mzA + mzB))
    const byTime = Math.abs(a.sumMinutes / a.members.length - b.sumMinutes / b.members.length) / settings.retentionMinutes
    return byMass > 1 || byTime > 1 ? Number.POSITIVE_INFINITY : byMass * byMass + byTime * byTime
  }
  const allowed = (a: PlainCluster, b: PlainCluster): boolean => {
    if (Math.max(a.refusals, b.refusals) >= mostRefusals) return false
    if (refused.has(`${a.stamp} ${b.stamp}`)) return false
    const members = [...a.members, ...b.members]
    if (new Set(members.map(index => at(index).table)).size < members.length) return false
    const mz = (a.sumMz + b.sumMz) / members.length
    const minutes = (a.sumMinutes + b.sumMinutes) / members.length
    return members.every(index => Math.abs(at(index).mz - mz) <= tolerance(mz) && Math.abs(at(index).minutes - minutes) <= settings.retentionMinutes)
  }
  const crosses = (a: PlainCluster, b: PlainCluster): boolean => {
    const members = [...a.members, ...b.members]
    const mz = (a.sumMz + b.sumMz) / members.length
    return clusters.some((other) => {
      if (other === a || other === b || Math.abs(other.sumMz / other.members.length - mz) > tolerance(mz)) return false
      const signs = members.flatMap(index => other.members
        .filter(rival => at(rival).table === at(index).table)
        .map(rival => Math.sign(at(rival).minutes - at(index).minutes)))
      return signs.includes(1) && signs.includes(-1)
    })
  }
  const step = (): boolean => {
    let best: { a: PlainCluster, b: PlainCluster, distance: number, key: [number, number] } | null = null
    for (const [i, a] of clusters.entries()) {
      for (const b of clusters.slice(i + 1)) {
        const apart = distance(a, b)
        const key: [number, number] = [Math.min(a.members[0] ?? 0, b.members[0] ?? 0), Math.max(a.members[0] ?? 0, b.members[0] ?? 0)]
        if (apart === Number.POSITIVE_INFINITY || !allowed(a, b)) continue
        if (best && (apart > best.distance || (apart === best.distance && (key[0] - best.key[0] || key[1] - best.key[1]) >= 0))) continue
        best = { a, b, distance: apart, key }
      }
    }
    if (!best) return false
    const { a, b } = best
    if (crosses(a, b)) {
      a.refusals++
      b.refusals++
      refused.add(`${a.stamp} ${b.stamp}`)
      refused.add(`${b.stamp} ${a.stamp}`)
      return true
    }
    const merged = { members: [...a.members, ...b.members].sort((x, y) => x - y), sumMz: a.sumMz + b.sumMz, sumMinutes: a.sumMinutes + b.sumMinutes, stamp: stamps++, refusals: 0 }
    clusters = [...clusters.filter(cluster => cluster !== a && cluster !== b), merged]
    return true
  }
  for (const entering of [false, true]) {
    features.forEach((_, index) => {
      if (lesser[index] === entering) clusters.push(single(index))
    })
    while (step());
  }
  return clusters.map(cluster => cluster.members).sort((a, b) => (a[0] ?? 0) - (b[0] ?? 0))
}
