import { randomBytes } from 'node:crypto'
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/** The secret that seals session cookies: made once, in the data folder, 0600. */
export function sealingSecret(folder: string): string {
  const path = join(folder, 'sealing-secret')
  try {
    writeFileSync(path, randomBytes(32).toString('hex'), { mode: 0o600, flag: 'wx' })
  }
  catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error
  }
  return readFileSync(path, 'utf8')
}
