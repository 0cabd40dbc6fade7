/** Reasons by code. Codes are stored with every version: append, never reorder. */
export const REASONS = [
  'inNeither',
  'divert', 'intensityLimit', 'blankBorne', 'byHand',
  'foundOnly', 'neighbour', 'gapFilled', 'belowReach',
  'patchyClear', 'patchy',
  'moreTested', 'moreAssumed',
  'levelTested', 'levelSmallDifference', 'levelAssumed',
  'notCertain', 'smallNotLevel', 'smallButCertain', 'assumedBetween', 'noSpread',
  'blankOverlap',
  'signalInTrace',
] as const
export type Reason = (typeof REASONS)[number]

/** Code of each reason: its place in REASONS. */
export const REASON = Object.fromEntries(REASONS.map((name, code) => [name, code])) as Record<Reason, number>

/** The reason in two or three words, for filters and tables. */
export const REASON_LABELS: Record<Reason, string> = {
  inNeither: 'in neither side',
  divert: 'sent to waste',
  intensityLimit: 'below the intensity limit',
  blankBorne: 'blank-borne',
  byHand: 'set aside by hand',
  foundOnly: 'found on one side',
  neighbour: 'a neighbour holds the other side',
  gapFilled: 'gap-filled table',
  belowReach: 'out of reach',
  patchyClear: 'patchy, but clear',
  patchy: 'patchy',
  moreTested: 'difference certain',
  moreAssumed: 'difference, precision assumed',
  levelTested: 'equivalent',
  levelSmallDifference: 'equivalent, a smaller difference is certain',
  levelAssumed: 'level, precision assumed',
  notCertain: 'difference not certain',
  smallNotLevel: 'neither different nor level',
  smallButCertain: 'different, by how much is open',
  assumedBetween: 'between limits, precision assumed',
  noSpread: 'no spread between replicates',
  blankOverlap: 'near the other side, which is not above blank',
  signalInTrace: 'a signal stands in the other side\'s trace',
}

/** The words for one feature: what counts as not found though its table lists it says so, or the row would seem to contradict itself. */
export function reasonLabel(reason: number, notAboveBlank: number): string {
  const name = REASONS[reason] ?? 'inNeither'
  return name === 'foundOnly' && notAboveBlank > 0 ? 'other side not above blank' : REASON_LABELS[name]
}

/** How a ratio was judged. Codes are stored: append, never reorder. */
export const METHODS = ['none', 'welch', 'assumed'] as const
export const METHOD = { none: 0, welch: 1, assumed: 2 } as const
