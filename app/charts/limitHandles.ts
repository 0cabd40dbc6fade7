import type { ComparisonSettings } from '#shared/science/verdict/settings'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { threeDigits, times } from '#shared/science/numeric/numberWords'
import type { PaneName } from '~/charts/foldFrame'
import type { FoldPlotKind } from '~/charts/foldPoints'

type Limits = Pick<ComparisonSettings, 'foldLimit' | 'alpha' | 'reachLimit'>
export type LimitId = 'foldA' | 'foldB' | 'alpha' | 'reachA' | 'reachB'

/** A limit that can be moved on the plot: a line of a pane, at a value of one of its axes. */
export interface LimitHandle {
  id: LimitId
  pane: PaneName
  /** Does the line stand upright, so that it moves across? */
  upright: boolean
  /** On the axis, and how far it can go there. */
  at: number
  lowest: number
  highest: number
  label: string
  /** On the handle, and for who does not see it. */
  short: string
  says: string
}

const TIMES = { least: 1.1, most: 1000 }
const ALPHA = { least: 1e-6, most: 0.5 }

/** The handles of the limits, in the order of the plot from left to right. */
export function limitHandles({ foldLimit, alpha, reachLimit }: Limits, kind: FoldPlotKind, names: SideNames): LimitHandle[] {
  const fold = times(2 ** foldLimit)
  const reach = times(reachLimit)
  const furthest = Math.log2(TIMES.most)
  const nearest = Math.log2(TIMES.least)
  const reachHandle = (id: 'reachA' | 'reachB', name: string, other: string): LimitHandle => ({
    id, pane: id === 'reachA' ? 'laneA' : 'laneB', upright: false, at: Math.log10(reachLimit), lowest: Math.log10(TIMES.least), highest: Math.log10(TIMES.most),
    label: `Reach limit, in the lane of ${name}`, short: reach, says: `${reach}: what stands lower, ${other} could not have shown`,
  })
  return [
    reachHandle('reachA', names.a, names.b),
    { id: 'foldA', pane: 'ratios', upright: true, at: -foldLimit, lowest: -furthest, highest: -nearest, label: `Fold limit, line of ${names.a}`, short: fold, says: `${fold} more in ${names.a}` },
    ...(kind === 'certainty' ? [{ id: 'alpha' as const, pane: 'ratios' as const, upright: false, at: -Math.log10(alpha), lowest: -Math.log10(ALPHA.most), highest: -Math.log10(ALPHA.least), label: 'Alpha', short: `q ${threeDigits(alpha)}`, says: `q at most ${threeDigits(alpha)}` }] : []),
    { id: 'foldB', pane: 'ratios', upright: true, at: foldLimit, lowest: nearest, highest: furthest, label: `Fold limit, line of ${names.b}`, short: fold, says: `${fold} more in ${names.b}` },
    reachHandle('reachB', names.b, names.a),
  ]
}

/** The setting that puts a limit at this value of its axis, in sensible digits and within its range. */
export function movedLimit(id: LimitId, at: number): Partial<Limits> {
  switch (id) {
    case 'foldA': return { foldLimit: Math.log2(snapTimes(2 ** -at)) }
    case 'foldB': return { foldLimit: Math.log2(snapTimes(2 ** at)) }
    case 'alpha': return { alpha: snapAlpha(10 ** -at) }
    case 'reachA':
    case 'reachB': return { reachLimit: snapTimes(10 ** at) }
  }
}

/** The limit so many sensible steps on along its axis. */
export function steppedLimit(id: LimitId, { foldLimit, alpha, reachLimit }: Limits, steps: number): Partial<Limits> {
  switch (id) {
    case 'foldA': return { foldLimit: Math.log2(stepTimes(2 ** foldLimit, -steps)) }
    case 'foldB': return { foldLimit: Math.log2(stepTimes(2 ** foldLimit, steps)) }
    case 'alpha': return { alpha: stepAlpha(alpha, -steps) }
    case 'reachA':
    case 'reachB': return { reachLimit: stepTimes(reachLimit, steps) }
  }
}

/** Between the values a ratio is set to: 0.1 below ×5, 0.5 below ×10, 1 below ×100, 10 above. */
const between = (value: number) => value < 5 ? 0.1 : value < 10 ? 0.5 : value < 100 ? 1 : 10

/** The nearest sensible ratio: ×1.1, ×1.2 … ×5, ×5.5 … ×10, ×11 … ×100, ×110 … ×1000. */
export function snapTimes(value: number): number {
  const within = Math.min(TIMES.most, Math.max(TIMES.least, value))
  const step = between(within)
  return Number((Math.round(within / step) * step).toFixed(1))
}

function stepTimes(value: number, steps: number): number {
  const one = Math.sign(steps)
  let at = snapTimes(value)
  for (let left = Math.abs(steps); left > 0; left--) at = snapTimes(at + one * between(one < 0 ? at - 1e-9 : at))
  return at
}

/** The nearest share of one digit: 0.04, 0.05, 0.06. */
export function snapAlpha(value: number): number {
  return Number(Math.min(ALPHA.most, Math.max(ALPHA.least, value)).toPrecision(1))
}

function stepAlpha(value: number, steps: number): number {
  const one = Math.sign(steps)
  let at = snapAlpha(value)
  for (let left = Math.abs(steps); left > 0; left--) {
    const digit = 10 ** Math.floor(Math.log10(at * (one < 0 ? 1 - 1e-9 : 1 + 1e-9)))
    at = snapAlpha(at + one * digit)
  }
  return at
}
