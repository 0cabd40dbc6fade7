const totalWords = /^(?:grand |sub)?(?:total|totals|sum|summe|gesamt|gesamtsumme|somme|totaux|mean|average|mittelwert|moyenne|count|anzahl|nombre)\s*:?$/i

/** Lines without features that a file may hold among its rows. */
export type SkippedKind = 'blank' | 'comment' | 'total'

/** What kind of line this is if it is none with a feature; null for an ordinary row. A row with a number for its m/z is always ordinary: ask before. */
export function skippedKind(row: readonly string[]): SkippedKind | null {
  for (const cell of row) {
    const text = cell.trim()
    if (text === '') continue
    if (text.startsWith('#') || text.startsWith('//')) return 'comment'
    return totalWords.test(text) ? 'total' : null
  }
  return 'blank'
}
