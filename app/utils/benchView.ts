import { flagKinds, type FlagKind } from '#shared/schemas/flag'
import { COUNTED_VERDICTS, type Verdict } from '#shared/science/verdict/verdicts'
import { SORT_KEYS, type FeatureSort, type SortKey } from '~/utils/featureOrder'

/** Features with or without flags; with any flag; with a flag of one kind. */
export type FlagFilter = 'all' | 'flagged' | FlagKind

/** What of the bench the address holds, so that a copied link opens it again. */
export interface BenchView {
  /** Place of the selected feature in the alignment. */
  selected: number | null
  verdicts: Verdict[]
  flags: FlagFilter
  find: string
  massPpm: number
  sort: FeatureSort
}

export const benchDefaults: Readonly<BenchView> = {
  selected: null, verdicts: [], flags: 'all', find: '', massPpm: 10, sort: { key: 'intensity', descending: true },
}

export type Query = Record<string, string | undefined>

/** The view as a query; what stands as by default is left out. Features are numbered from 1, as on the page. */
export function viewToQuery(view: BenchView): Query {
  const { selected, verdicts, flags, find, massPpm, sort } = view
  const sortText = (each: FeatureSort) => `${each.descending ? '-' : ''}${each.key}`
  return {
    feature: selected === null ? undefined : String(selected + 1),
    verdict: verdicts.length > 0 ? COUNTED_VERDICTS.filter(name => verdicts.includes(name)).join('.') : undefined,
    flags: flags === 'all' ? undefined : flags,
    find: find || undefined,
    ppm: massPpm === benchDefaults.massPpm ? undefined : String(massPpm),
    sort: sortText(sort) === sortText(benchDefaults.sort) ? undefined : sortText(sort),
  }
}

/** Reads a query, whatever a person made of it; what is no view stands as by default. */
export function queryToView(query: Record<string, unknown>): BenchView {
  const text = (name: string) => typeof query[name] === 'string' ? query[name] : ''
  const feature = /^\d{1,9}$/.test(text('feature')) ? Number(text('feature')) : 0
  const named = text('verdict').split('.')
  const massPpm = Number(text('ppm'))
  return {
    selected: feature > 0 ? feature - 1 : null,
    verdicts: COUNTED_VERDICTS.filter(name => named.includes(name)),
    flags: (['flagged', ...flagKinds] as const).find(name => name === text('flags')) ?? 'all',
    find: text('find').slice(0, 200),
    massPpm: massPpm > 0 && massPpm <= 10_000 ? massPpm : benchDefaults.massPpm,
    sort: sortOf(text('sort')),
  }
}

function sortOf(text: string): FeatureSort {
  const descending = text.startsWith('-')
  const key = text.slice(descending ? 1 : 0)
  return isSortKey(key) ? { key, descending } : benchDefaults.sort
}

function isSortKey(key: string): key is SortKey {
  return (SORT_KEYS as readonly string[]).includes(key)
}
