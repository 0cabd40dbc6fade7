import { SLICE_DA, slicesBetween, type Centroids } from '../../../../shared/science/traces/centroids'
import { readCentroidsNow } from './readCentroids'

/** Inside a slice, and not yet in the next. */
const BELOW_NEXT = SLICE_DA * (1 - 1e-9)

/**
 * Gives a trace's slices to a worker that asks in ascending m/z: each is read and unpacked once, and let go when it is passed.
 *
 * @param folder the data folder
 */
export function sliceReader(folder: string, traceId: string): (lowestMz: number, highestMz: number) => Centroids[] {
  const held = new Map<number, Centroids>()
  return (lowestMz, highestMz) => {
    const wanted = slicesBetween(lowestMz, highestMz)
    for (const slice of held.keys()) if (slice < (wanted[0] ?? 0)) held.delete(slice)
    return wanted.map((slice) => {
      const known = held.get(slice)
      if (known) return known
      const read = readCentroidsNow(folder, traceId, { lowMz: slice * SLICE_DA, highMz: slice * SLICE_DA + BELOW_NEXT })
      held.set(slice, read)
      return read
    })
  }
}
