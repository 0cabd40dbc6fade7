import { readFileSync } from 'node:fs'
import { readFile } from 'node:fs/promises'
import { promisify } from 'node:util'
import { gunzip, gunzipSync } from 'node:zlib'
import { slicesBetween, type Centroids } from '../../../../shared/science/traces/centroids'
import type { MzWindow } from '../../../../shared/science/traces/extractTrace'
import { joinCentroids, noCentroids, pointsWithin } from './centroidBytes'
import { slicePath, traceFolder } from './traceFolder'

const unpack = promisify(gunzip)

/**
 * The kept points of a trace within a window of m/z, ascending: reads one slice, at a border two. Where no slice stands, nothing was measured.
 *
 * @param folder the data folder
 * @throws where a slice can't be read
 */
export async function readCentroids(folder: string, traceId: string, window: MzWindow): Promise<Centroids> {
  const path = traceFolder(folder, traceId)
  return joinCentroids(await Promise.all(slicesBetween(window.lowMz, window.highMz).map(async (slice) => {
    const bytes = await readFile(slicePath(path, slice)).catch(missing)
    return bytes ? pointsWithin(await unpack(bytes), window) : noCentroids()
  })))
}

/** The same without waiting, for a worker. A job over many features asks for them in the order of m/z, a whole slice at a time. */
export function readCentroidsNow(folder: string, traceId: string, window: MzWindow): Centroids {
  const path = traceFolder(folder, traceId)
  return joinCentroids(slicesBetween(window.lowMz, window.highMz).map((slice) => {
    const bytes = readNow(slicePath(path, slice))
    return bytes ? pointsWithin(gunzipSync(bytes), window) : noCentroids()
  }))
}

function readNow(path: string): Buffer | null {
  try {
    return readFileSync(path)
  }
  catch (error) {
    return missing(error)
  }
}

function missing(error: unknown): null {
  if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return null
  throw error
}
