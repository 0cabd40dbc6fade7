import type { Verdict } from '#shared/science/verdict/verdicts'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { formatCount } from '~/utils/formatMeasures'

export const MOST_DEGREES = 6

export interface BeamLean {
  /** Positive: B's end hangs lower. */
  degrees: number
  text: string
}

/** How the beam lies: to the side with more one-sided and greater features, in proportion, at most 6°. */
export function beamLean(counts: Record<Verdict, number>, names: SideNames): BeamLean {
  const a = counts.onlyA + counts.moreA
  const b = counts.onlyB + counts.moreB
  if (a === b) return { degrees: 0, text: a === 0 ? 'Level: no feature is certain to be more on either side.' : `Level: ${formatCount(a)} features weigh for either side.` }
  const [side, own, other] = a > b ? [names.a, a, b] : [names.b, b, a]
  return {
    degrees: MOST_DEGREES * (b - a) / (a + b),
    text: `Leans to ${side}: ${formatCount(own)} features are found only there or are more there, ${formatCount(other)} on the other side.`,
  }
}

export interface BeamDrawing { left: [number, number], right: [number, number] }

/** Ends of a beam on a pivot at `at`, each `arm` long. */
export function beamEnds(degrees: number, [x, y]: [number, number], arm: number): BeamDrawing {
  const radians = degrees * Math.PI / 180
  const [across, down] = [arm * Math.cos(radians), arm * Math.sin(radians)]
  return { left: [x - across, y - down], right: [x + across, y + down] }
}
