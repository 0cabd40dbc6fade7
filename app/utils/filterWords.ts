import { flagKindNames } from '#shared/schemas/flag'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { verdictPhrase } from '#shared/science/verdict/verdictPhrase'
import { VERDICT } from '#shared/science/verdict/verdicts'
import type { BenchView } from '~/utils/benchView'
import type { MassTarget } from '~/utils/massTarget'
import { OPEN_RANGE, rangeWords } from '~/utils/numberRange'
import { RANGE_FILTERS, RANGE_NAMES } from '~/utils/rangeFilters'

/** One filter that stands, in words, and what takes it away. */
export interface FilterWords { words: string, without: Partial<BenchView> }

/** The filters that stand, one by one; for chips on the page and for what stands above an export. */
export function filterWords(view: BenchView, foldLimit: number, names: SideNames): FilterWords[] {
  const words: FilterWords[] = view.verdicts.map(verdict => ({ words: verdictPhrase(VERDICT[verdict], foldLimit, names), without: { verdicts: view.verdicts.filter(each => each !== verdict) } }))
  if (view.flags !== 'all') words.push({ words: view.flags === 'flagged' ? 'with a flag' : `flag: ${flagKindNames[view.flags]}`, without: { flags: 'all' } })
  if (view.find.trim() !== '') words.push({ words: `found by “${view.find.trim()}” (m/z within ${view.massPpm} ppm)`, without: { find: '' } })
  if (view.mzNear) words.push({ words: `m/z ${massWords(view.mzNear)}`, without: { mzNear: null } })
  if (view.massNear) words.push({ words: `fits an ion of M ${massWords(view.massNear)}`, without: { massNear: null } })
  if (view.formula) words.push({ words: `fits an ion of ${view.formula.formula} within ${view.formula.ppm} ppm: not an identification`, without: { formula: null } })
  for (const name of RANGE_NAMES) {
    const { label, words: bound } = RANGE_FILTERS[name]
    if (view[name].from !== null || view[name].to !== null) words.push({ words: `${label} ${rangeWords(view[name], bound)}`, without: { [name]: { ...OPEN_RANGE } } })
  }
  if (view.area) words.push({ words: 'inside the area drawn on the plot', without: { area: null } })
  return words
}

const massWords = ({ value, ppm }: MassTarget) => `${value} ± ${ppm} ppm`
