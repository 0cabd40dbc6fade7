import type { Readable } from 'node:stream'
import { sendStream, type H3Event } from 'h3'

/** Sends a stream, and lets go of what it reads from (an open file, an export under way) where the receiver goes away half way. */
export function sendDownload(event: H3Event, stream: Readable): Promise<void> {
  event.node.res.once('close', () => stream.destroy())
  return sendStream(event, stream)
}
