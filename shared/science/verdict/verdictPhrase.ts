import { times } from '../numeric/numberWords'
import type { SideNames } from './reasonFacts'
import { REASON } from './reasons'
import { VERDICTS } from './verdicts'

/** The verdict in words: "found only in Millrace", "level within ×2". `clear` adds the factor of a patchy but clear one. */
export function verdictPhrase(verdict: number, foldLimit: number, names: SideNames, clear?: { reason: number, atLeast: number }): string {
  const atLeast = clear?.reason === REASON.patchyClear ? `, at least ${times(clear.atLeast)}` : ''
  switch (VERDICTS[verdict]) {
    case 'onlyA': return `found only in ${names.a}`
    case 'onlyB': return `found only in ${names.b}`
    case 'moreA': return `more in ${names.a}${atLeast}`
    case 'moreB': return `more in ${names.b}${atLeast}`
    case 'level': return `level within ${times(2 ** foldLimit)}`
    case 'unsettled': return 'unsettled'
    case 'setAside': return 'set aside'
    default: return 'in neither side'
  }
}
