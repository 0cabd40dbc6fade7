/** A name as words: without path and extensions, case and marks; numbers and letters stand apart ("Press_A1.csv" is "press a 1"). */
function wordsOf(name: string): string[] {
  return name.replace(/^.*[/\\]/, '').replace(/(\.(csv|tsv|txt|tab|dat|raw|d|wiff|mzml|gz))+$/i, '')
    .normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().match(/\p{L}+|\p{N}+/gu) ?? []
}

/**
 * The place of the sample that a file or a column belongs to by its name, or null. Equal words first; else the one sample whose words
 * stand as they are within the name ("2026-03-02 Press A1 features.csv"), the longest if several are nested; two that are equally near match nothing.
 */
export function matchSample(name: string, sampleNames: readonly string[]): number | null {
  const own = wordsOf(name)
  const samples = sampleNames.map(wordsOf)
  const equal = samples.flatMap((words, index) => words.length > 0 && joined(words) === joined(own) ? [index] : [])
  if (equal.length > 0) return equal.length === 1 ? equal[0] ?? null : null
  const within = samples.flatMap((words, index) => words.length > 0 && contains(own, words) ? [index] : [])
  const longest = Math.max(0, ...within.map(index => samples[index]?.length ?? 0))
  const nearest = within.filter(index => samples[index]?.length === longest)
  return nearest.length === 1 ? nearest[0] ?? null : null
}

/** Words of letters run together ("press a" as "pressa"); numbers stay apart. */
function joined(words: readonly string[]): string {
  return words.join(' ').replace(/(\p{L}) (?=\p{L})/gu, '$1')
}

function contains(words: readonly string[], part: readonly string[]): boolean {
  return words.some((_, at) => part.every((word, offset) => words[at + offset] === word))
}
