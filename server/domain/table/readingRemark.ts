import type { SkippedKind } from '../../../shared/science/table/skippedLines'

const kinds: Record<SkippedKind, string> = { blank: 'blank', comment: 'comment', total: 'total' }

/** What was noticed while a file was read, as sentences; null where nothing was. */
export function remarkOf({ skipped, cautions, twins, taken }: { skipped: Record<SkippedKind, number>, cautions: string[], twins: string[], taken: string[] }): string | null {
  const sentences = [...cautions]
  // Blank lines carry nothing, so they are not worth a word of their own.
  const passed = (['comment', 'total'] as const).filter(kind => skipped[kind] > 0).map(kind => `${skipped[kind]} ${kinds[kind]} ${skipped[kind] === 1 ? 'line' : 'lines'}`)
  if (passed.length > 0) sentences.push(`Passed over: ${passed.join(' and ')}.`)
  for (const twin of twins) sentences.push(`The same features stand in ${twin}.`)
  for (const sample of taken) sentences.push(`“${sample}” has a table already: choose a sample, or replace that table.`)
  return sentences.length > 0 ? sentences.join(' ') : null
}
