import type { FlagLine } from '#shared/types/flag'
import type { FlagFilter } from '~/utils/benchView'

/** The features whose flags pass the filter; `all` asks for any flag. */
export function featuresWithFlag(flags: ReadonlyMap<number, FlagLine[]>, filter: FlagFilter): Set<number> {
  const passes = (line: FlagLine) => filter === 'all' || filter === 'flagged' || line.kind === filter
  return new Set([...flags].flatMap(([feature, lines]) => lines.some(passes) ? [feature] : []))
}
