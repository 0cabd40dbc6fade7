import { NOTHING, type DemoCompound } from './compounds'

const acid = { '[M-H]-': 1 }

/** What solvents, plastics and soaps leave in every negative-mode run: true ions, invented levels. */
export const negativeBackground: readonly DemoCompound[] = ([
  ['dodecyl sulfate', 'C12H26O4S', 11.92, 14_000],
  ['dodecylbenzenesulfonic acid', 'C18H30O3S', 12.71, 22_000],
  ['palmitic acid', 'C16H32O2', 13.92, 41_000],
  ['stearic acid', 'C18H36O2', 14.38, 33_000],
  ['oleic acid', 'C18H34O2', 14.02, 9_000],
  ['azelaic acid', 'C9H16O4', 7.34, 6_500],
] satisfies [string, string, number, number][]).map(([name, formula, retentionMinutes, solvent]) => ({ ...NOTHING, name, formula, retentionMinutes, solvent, ions: acid }))

/** Ions that bleed over the whole run, m/z: trifluoroacetate and a siloxane in negative mode, a phthalate and siloxanes in positive. */
export const wholeRunIons = {
  negative: [112.98558, 255.23295, 311.16864],
  positive: [149.02332, 279.15909, 371.10123],
} as const

/** m/z of the salt clusters that leave with the unretained front: sodium formate, [Na(n)(HCOO)(n ± 1)]. */
export const frontIons = {
  negative: Array.from({ length: 12 }, (_, n) => 112.98561 + n * 67.98742),
  positive: Array.from({ length: 12 }, (_, n) => 90.97665 + n * 67.98742),
} as const
