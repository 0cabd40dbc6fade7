import type { H3Event } from 'h3'
import { Turns } from '../domain/trace/turns'

/** Answers through one link that are under way at once: each is some megabytes in memory until it is sent. */
const EACH_AT_ONCE = 8
/** A whole class may open a link at once. */
const MOST_WAITING = 200
/** A reader that takes nothing for this long is cut off. */
const SILENCE_MS = 60_000

const turns = new Turns(Number.POSITIVE_INFINITY, MOST_WAITING, EACH_AT_ONCE)

/** Packs columns for a guest in turn. The turn lasts until they are sent, so that readers who take their time pile up nothing. */
export function packInTurn<T extends Uint8Array>(event: H3Event, asker: string, pack: () => T): Promise<T | null> {
  const { res } = event.node
  return new Promise((resolve, reject) => {
    const sent = () => new Promise<void>((done, failed) => {
      res.once('close', done)
      res.setTimeout(SILENCE_MS)
      try {
        resolve(pack())
      }
      catch (error) {
        failed(error instanceof Error ? error : new Error(String(error)))
      }
    })
    turns.take(asker, () => !res.closed && !res.destroyed, sent).then(() => resolve(null), reject)
  })
}
