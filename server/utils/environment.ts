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

/**
 * Where links of this server begin, decided here alone: STEELYARD_URL where it is set, else the host of the request,
 * which the hosts middleware has checked. Never a header that claims another address.
 */
export function ownAddress(requestHost = `127.0.0.1:${process.env.PORT || '3000'}`): string {
  const url = process.env.STEELYARD_URL
  return url ? new URL(url).origin : `http://${requestHost}`
}

/** What is wrong with the settings of the address, in sentences: `stop` where the server can't run so, `notice` where people would be turned away. */
export function addressProblem({ STEELYARD_URL, STEELYARD_HOST }: NodeJS.ProcessEnv): { stop?: string, notice?: string } {
  if (STEELYARD_URL && !/^https?:$/.test(URL.canParse(STEELYARD_URL) ? new URL(STEELYARD_URL).protocol : '')) {
    return { stop: `STEELYARD_URL is "${STEELYARD_URL}", which is no address. Give it with http:// or https://, such as STEELYARD_URL=https://steelyard.example` }
  }
  if (STEELYARD_HOST && !STEELYARD_URL && !['127.0.0.1', 'localhost', '::1'].includes(STEELYARD_HOST)) {
    return { notice: `Listening on ${STEELYARD_HOST}, but answering only under this machine's own names. Set STEELYARD_URL to the address people type, such as STEELYARD_URL=http://lab-server:${process.env.PORT || '3000'}, and start again.` }
  }
  return {}
}
