/** Verdicts by code. Codes are stored with every version: append, never reorder. */
export const VERDICTS = ['inNeither', 'onlyA', 'onlyB', 'moreA', 'moreB', 'level', 'unsettled', 'setAside'] as const
export type Verdict = (typeof VERDICTS)[number]

/** Code of each verdict: its place in VERDICTS. */
export const VERDICT = Object.fromEntries(VERDICTS.map((name, code) => [name, code])) as Record<Verdict, number>

/** Verdicts that a comparison counts, in the order of the balance bar; "in neither side" is stated apart. */
export const COUNTED_VERDICTS = ['onlyA', 'moreA', 'level', 'moreB', 'onlyB', 'unsettled', 'setAside'] as const satisfies readonly Verdict[]

/** The verdict that a swap of the sides turns each verdict into. */
export const MIRRORED: Record<Verdict, Verdict> = {
  inNeither: 'inNeither', onlyA: 'onlyB', onlyB: 'onlyA', moreA: 'moreB', moreB: 'moreA', level: 'level', unsettled: 'unsettled', setAside: 'setAside',
}
