import { plainWords } from './headerCell'
import type { NamedColumn, ShapeGuess } from './tableColumns'

/**
 * A text that is the same for all files of one shape: the words of their header, with one star for any run of a wide table's sample columns.
 * Answers given for one file hold for the others of its shape.
 */
export function shapeFingerprint(columns: readonly NamedColumn[], shape: ShapeGuess, hasHeader: boolean): string {
  if (!hasHeader) return `no header, ${columns.length} columns`
  const samples = new Set(shape.samples.flatMap(sample => [sample.column, sample.minutesColumn]))
  const words = columns.map(column => samples.has(column.index) ? '*' : plainWords(column.title))
  while (words.at(-1) === '') words.pop()
  return `${shape.shape}|${words.filter((word, index) => word !== '*' || words[index - 1] !== '*').join('|')}`
}
