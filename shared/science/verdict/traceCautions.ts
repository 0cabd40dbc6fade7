import type { SideSummary, SummarisedSide } from './sideSummary'

/** What the traces that were looked into leave open, as sentences; none where no compared sample has one. */
export function traceCautions({ a, b, samples }: SideSummary): string[] {
  const without = [...a.traces.without, ...b.traces.without].flatMap(index => samples[index]?.name ?? []).sort()
  const compared = a.traces.samples + b.traces.samples
  if (without.length === compared) return []
  return [
    ...(without.length > 0 ? [`Traces of ${compared - without.length} of ${compared} compared samples were looked into. What the tables of ${without.join(', ')} do not list was not looked for there.`] : []),
    ...unmeasured(a, 'A', 'B'),
    ...unmeasured(b, 'B', 'A'),
  ]
}

function unmeasured({ traces, allHeights }: SummarisedSide, own: 'A' | 'B', other: 'A' | 'B'): string[] {
  if (traces.without.length < traces.samples) return []
  return [allHeights
    ? `Side ${own} has no trace: what the traces of side ${other} show is measured against the heights of its tables.`
    : `Side ${own} has no trace, and its tables do not give heights: what the traces of side ${other} show can't be measured, and moves no verdict.`]
}
