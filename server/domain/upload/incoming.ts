import { readdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'

/** Files on their way in. What stands here at start-up was cut off, and goes. */
export function emptyIncoming(folder: string) {
  const incoming = join(folder, 'incoming')
  for (const name of readdirSync(incoming)) rmSync(join(incoming, name), { recursive: true })
}
