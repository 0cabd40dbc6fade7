import { resolve } from 'node:path'
import type { LaboratoryKind } from '../db/open'

/** demo unless `start:lab` says otherwise. */
export function laboratoryKind(): LaboratoryKind {
  return process.env.STEELYARD_KIND === 'lab' ? 'lab' : 'demo'
}

export function dataFolder(kind: LaboratoryKind): string {
  return resolve(process.env.STEELYARD_DATA || `.data/${kind}`)
}

/** Names under which this server may be addressed: this machine's own, and the one of STEELYARD_URL. */
export function ownHosts(): string[] {
  const url = process.env.STEELYARD_URL
  return ['127.0.0.1', 'localhost', '[::1]', ...(url ? [new URL(url).hostname] : [])]
}
