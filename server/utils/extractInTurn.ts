import type { H3Event } from 'h3'
import { Turns } from '../domain/trace/turns'

/** One slice of a large run is some hundred megabytes in memory. */
const AT_ONCE = 2
/** Of one person, or through one link, which a whole class may open. */
const MOST_WAITING = 50

const turns = new Turns(AT_ONCE, MOST_WAITING)

/** Cuts traces out of raw data in turn, and sends them packed; ends where the reader goes away. */
export async function extractInTurn(event: H3Event, asker: string, extract: (signal: AbortSignal) => Promise<Uint8Array>): Promise<Uint8Array | null> {
  const leaving = new AbortController()
  event.node.res.once('close', () => leaving.abort())
  try {
    const packed = await turns.take(asker, () => !leaving.signal.aborted, () => extract(leaving.signal))
    if (packed) setResponseHeader(event, 'content-type', 'application/octet-stream')
    return packed
  }
  catch (error) {
    if (leaving.signal.aborted) return null
    throw error
  }
}
