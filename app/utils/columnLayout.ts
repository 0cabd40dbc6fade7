import type { SortKey } from '~/utils/featureOrder'

/** The columns a person may choose, and their short names in the address. */
export const COLUMN_CODES = {
  flags: 'g', number: 'n', mz: 'z', minutes: 't', verdict: 'v', ratio: 'r', q: 'q', reach: 'c', levelA: 'la', levelB: 'lb', foundA: 'fa', foundB: 'fb',
  intensity: 'h', reason: 'w', low: 'l', high: 'u', p: 'p', equivalenceP: 'e', method: 'j', atLeast: 'x', traceRatio: 'tr', blankA: 'ba', blankB: 'bb', mass: 'm',
} as const satisfies Record<SortKey, string>
export type ColumnId = keyof typeof COLUMN_CODES
export const COLUMN_IDS = Object.keys(COLUMN_CODES) as ColumnId[]

/** Which columns stand in the table, from the left, and how many of them stay while one scrolls sideways. */
export interface ColumnLayout { shown: readonly ColumnId[], frozen: number }

/** This column always stands: without it nobody knows which feature a row is. */
export const ALWAYS_SHOWN: ColumnId = 'mz'

export const DEFAULT_LAYOUT: ColumnLayout = {
  shown: ['flags', 'number', 'mz', 'minutes', 'verdict', 'ratio', 'q', 'reach', 'levelA', 'levelB', 'foundA', 'foundB', 'intensity', 'reason'],
  frozen: 3,
}

/** "g.n.z~t.v": the frozen columns before the tilde. */
export function writeLayout({ shown, frozen }: ColumnLayout): string {
  const codes = shown.map(id => COLUMN_CODES[id])
  return `${codes.slice(0, frozen).join('.')}~${codes.slice(frozen).join('.')}`
}

/** Reads what writeLayout wrote; undefined where it is none. Each column stands once, the m/z always. */
export function readLayout(text: string): ColumnLayout | undefined {
  const parts = text.split('~')
  if (parts.length !== 2) return undefined
  const seen = new Set<ColumnId>()
  const [frozen, scrolled] = parts.map(part => part.split('.').flatMap((code) => {
    const id = COLUMN_IDS.find(each => COLUMN_CODES[each] === code)
    if (!id || seen.has(id)) return []
    seen.add(id)
    return [id]
  }))
  if (!frozen || !scrolled || seen.size === 0) return undefined
  return seen.has(ALWAYS_SHOWN) ? { shown: [...frozen, ...scrolled], frozen: frozen.length } : { shown: [ALWAYS_SHOWN, ...frozen, ...scrolled], frozen: frozen.length + 1 }
}

/** Shows a column, at the end, or puts it away. */
export function withColumn({ shown, frozen }: ColumnLayout, id: ColumnId, isShown: boolean): ColumnLayout {
  const place = shown.indexOf(id)
  if (isShown) return place < 0 ? { shown: [...shown, id], frozen } : { shown, frozen }
  if (place < 0 || id === ALWAYS_SHOWN) return { shown, frozen }
  return { shown: shown.filter(each => each !== id), frozen: place < frozen ? frozen - 1 : frozen }
}

/** Moves a shown column to another place, held within the table. */
export function movedTo({ shown, frozen }: ColumnLayout, id: ColumnId, place: number): ColumnLayout {
  if (!shown.includes(id)) return { shown, frozen }
  const others = shown.filter(each => each !== id)
  const to = Math.max(0, Math.min(others.length, place))
  return { shown: [...others.slice(0, to), id, ...others.slice(to)], frozen }
}

/** Freezes all columns from the left to this one; null: none. */
export function frozenTo({ shown }: ColumnLayout, id: ColumnId | null): ColumnLayout {
  return { shown, frozen: id === null ? 0 : shown.indexOf(id) + 1 }
}

/** So many frozen columns leave at least `leastFree` of a frame of `width` to scroll in; all in the same unit. */
export function frozenThatFit(widths: readonly number[], frozen: number, width: number, leastFree: number): number {
  let sum = 0
  for (let place = 0; place < frozen; place++) {
    sum += widths[place] ?? 0
    if (sum > width - leastFree) return place
  }
  return frozen
}
