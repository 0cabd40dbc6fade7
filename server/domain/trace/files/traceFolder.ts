import { join } from 'node:path'

/** Where a trace's points are kept, a file a slice of m/z. `folder` is the data folder. */
export const traceFolder = (folder: string, traceId: string) => join(folder, 'traces', traceId)

/** Where they are gathered until they are whole. */
export const unfinishedFolder = (folder: string, traceId: string) => join(folder, 'traces', `${traceId}.part`)

/** The file of one slice: packed columns m/z, intensity, scan, ascending by m/z, compressed. */
export const slicePath = (path: string, slice: number) => join(path, `${slice}.gz`)
