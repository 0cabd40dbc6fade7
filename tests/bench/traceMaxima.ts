import { highestSignals } from '../../shared/science/traces/highestSignals'
import { manyCentroids, slicedTrace } from '../support/manyCentroids'
import { seededRandom } from '../support/seededRandom'
import { secondsOf } from './measure'

const FEATURES = 50_000
const CENTROIDS = 4_000_000
const SCANS = 4000
const RUN_MINUTES = 20

/** Speed of looking for every aligned feature in one sample's trace, its slices in memory, in processor time. */
export function benchTraceMaxima() {
  const { uniform } = seededRandom(5)
  const [lowestMz, highestMz] = [80, 1200]
  const mz = Float64Array.from({ length: FEATURES }, () => lowestMz + (highestMz - lowestMz) * uniform())
  const minutes = Float64Array.from({ length: FEATURES }, () => RUN_MINUTES * uniform())
  const scanMinutes = Float64Array.from({ length: SCANS }, (_, scan) => scan * RUN_MINUTES / SCANS)
  const trace = slicedTrace(manyCentroids(CENTROIDS, { scans: SCANS, lowestMz, highestMz }), { scanMinutes, offsetPpm: 2 })
  const taken = secondsOf(() => highestSignals(mz, minutes, trace, { alignMassPpm: 10, massFloorDa: null, retentionMinutes: 0.1 }))
  console.log(`${FEATURES} features in ${CENTROIDS} centroids of ${SCANS} scans: ${taken.toFixed(2)} s`)
}
