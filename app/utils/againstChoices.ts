import type { ComparisonDetail, ComparisonLine } from '#shared/types/comparison'

const keyOf = (comparisonId: string, number: number) => `${comparisonId}/${number}`

/** What a version can be held against, by key: the other versions of its comparison, and the newest of every other comparison. '' where none is chosen. */
export function againstChoices(comparison: ComparisonDetail, all: readonly ComparisonLine[]): { value: string, label: string }[] {
  const own = comparison.versions.filter(version => version.number !== comparison.version.number)
    .map(version => ({ value: keyOf(comparison.id, version.number), label: `version ${version.number} of this comparison` }))
  const others = all.filter(line => line.id !== comparison.id)
    .map(line => ({ value: keyOf(line.id, line.latest.number), label: `${line.title}, version ${line.latest.number}, on alignment ${line.latest.alignmentNumber}${line.practice ? ', practice' : ''}` }))
  return [{ value: '', label: 'choose a version' }, ...own, ...others]
}

/** The query that asks for a choice. */
export function againstQuery(key: string): { against?: string, againstComparison?: string } {
  const [againstComparison, against] = key.split('/')
  return againstComparison && against ? { against, againstComparison } : {}
}
