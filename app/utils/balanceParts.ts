import { COUNTED_VERDICTS, VERDICT, type Verdict } from '#shared/science/verdict/verdicts'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'

export interface BalancePart {
  name: (typeof COUNTED_VERDICTS)[number]
  /** Key of the bench that filters by it. */
  key: string
  code: number
  word: string
  count: number
  /** Of all that are compared, 0 to 1. */
  share: number
  fill: string
}

const fills: Record<(typeof COUNTED_VERDICTS)[number], string> = {
  onlyA: 'bg-side-a', moreA: 'bg-side-a/60', level: 'bg-level/70', moreB: 'bg-side-b/60', onlyB: 'bg-side-b', unsettled: 'bg-unsettled/50', setAside: 'bg-aside/40',
}

/** The parts of the balance bar in their order; together all that is compared. */
export function balanceParts(counts: Record<Verdict, number>, names: SideNames, foldLimit: number): BalancePart[] {
  const total = COUNTED_VERDICTS.reduce((sum, name) => sum + counts[name], 0)
  return COUNTED_VERDICTS.map((name, place) => ({
    name, key: String(place + 1), code: VERDICT[name], word: verdictPhrase(VERDICT[name], foldLimit, names), count: counts[name],
    share: total > 0 ? counts[name] / total : 0, fill: fills[name],
  }))
}
