import type { Palette } from '#shared/tokens'
import type { Verdict } from '#shared/science/verdict/verdicts'

/** Shape and colour of each verdict, the same on plot, bar, table and card. Colour never stands alone. */
export interface VerdictLook { colour: keyof Palette, shape: 'circle' | 'square' | 'dash' | 'ring' | 'cross' }

export const verdictLooks: Record<Verdict, VerdictLook> = {
  onlyA: { colour: 'sideA', shape: 'circle' },
  moreA: { colour: 'sideA', shape: 'circle' },
  level: { colour: 'level', shape: 'dash' },
  moreB: { colour: 'sideB', shape: 'square' },
  onlyB: { colour: 'sideB', shape: 'square' },
  unsettled: { colour: 'unsettled', shape: 'ring' },
  setAside: { colour: 'aside', shape: 'cross' },
  inNeither: { colour: 'muted', shape: 'cross' },
}
