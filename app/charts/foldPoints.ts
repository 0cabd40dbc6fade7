import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { METHOD } from '#shared/science/verdict/reasons'
import { VERDICT } from '#shared/science/verdict/verdicts'

/** Where a feature is drawn: in the lane of the side that alone shows it, on the plot of ratios, or nowhere. */
export const PLACE = { none: 0, laneA: 1, ratios: 2, laneB: 3 } as const

/** How the plot of ratios counts upwards: certainty where there are replicates, else abundance. */
export type FoldPlotKind = 'certainty' | 'abundance'

export interface FoldPoints {
  kind: FoldPlotKind
  place: Uint8Array
  /** On the plot of ratios log2 of B over A; in a lane the m/z. */
  x: Float64Array
  /** On the plot of ratios −log10 q or log10 of the level; in a lane log10 of the reach. */
  y: Float64Array
  /** Largest |log2 ratio| drawn, and the range of y. */
  widest: number
  lowest: number
  highest: number
  /** The same of the lanes; NaN where both are empty. */
  lowestReach: number
  highestReach: number
  lowestMz: number
  highestMz: number
  /** Drawn below the line of q = 1, because they were not tested. */
  untested: number
  /** Compared features without a place: no ratio, and no reach that is known. */
  notDrawn: number
}

/** −log10 of the smallest probability that is told apart. */
export const MOST_CERTAIN = 15
/** The strip of features that have a ratio but no test, below q = 1. */
const UNTESTED_FROM = -0.25
const UNTESTED_DEPTH = 0.4

/** A steady spread over 0 to 1, so that points of a strip do not hide each other: multiples of the golden ratio. */
const spread = (i: number) => (i * 0.618033988749895) % 1

const placed = new WeakMap<VerdictColumns, FoldPoints>()
/** The places of a result's features, computed once for plot and filter. */
export function placesOf(columns: VerdictColumns): FoldPoints {
  const points = placed.get(columns) ?? placeFeatures(columns)
  placed.set(columns, points)
  return points
}

/** Gives every feature its place; one-sided ones stand at their reach, never at infinity. */
export function placeFeatures(columns: VerdictColumns): FoldPoints {
  const features = columns.mz.length
  const kind: FoldPlotKind = columns.method.includes(METHOD.welch) ? 'certainty' : 'abundance'
  const points: FoldPoints = {
    kind, place: new Uint8Array(features), x: new Float64Array(features), y: new Float64Array(features),
    widest: 0, lowest: Number.POSITIVE_INFINITY, highest: Number.NEGATIVE_INFINITY, lowestReach: Number.NaN, highestReach: Number.NaN, lowestMz: Number.NaN, highestMz: Number.NaN, untested: 0, notDrawn: 0,
  }
  for (let i = 0; i < features; i++) {
    if (columns.verdict[i] === VERDICT.inNeither) continue
    const log2Ratio = columns.log2Ratio[i]!
    if (Number.isFinite(log2Ratio)) {
      points.place[i] = PLACE.ratios
      points.x[i] = log2Ratio
      points.y[i] = kind === 'abundance' ? abundance(columns, i) : certainty(columns, i, points)
      points.widest = Math.max(points.widest, Math.abs(log2Ratio))
      points.lowest = Math.min(points.lowest, points.y[i]!)
      points.highest = Math.max(points.highest, points.y[i]!)
      continue
    }
    const reach = Math.log10(columns.reach[i]!)
    if (!Number.isFinite(reach)) {
      points.notDrawn++
      continue
    }
    points.place[i] = shownSide(columns, i) === 'A' ? PLACE.laneA : PLACE.laneB
    points.x[i] = columns.mz[i]!
    points.y[i] = reach
    if (!(points.lowestReach <= reach)) points.lowestReach = reach
    if (!(points.highestReach >= reach)) points.highestReach = reach
    if (!(points.lowestMz <= points.x[i]!)) points.lowestMz = points.x[i]!
    if (!(points.highestMz >= points.x[i]!)) points.highestMz = points.x[i]!
  }
  return points
}

function abundance(columns: VerdictColumns, i: number): number {
  return Math.log10(Math.sqrt(columns.levelA[i]! * columns.levelB[i]!))
}

function certainty(columns: VerdictColumns, i: number, points: FoldPoints): number {
  const q = columns.q[i]!
  if (!Number.isNaN(q)) return Math.min(MOST_CERTAIN, -Math.log10(q))
  points.untested++
  return UNTESTED_FROM - UNTESTED_DEPTH * spread(i)
}

/** The side that a one-sided feature is seen on: a side that is not above blank counts as not found. */
function shownSide(columns: VerdictColumns, i: number): 'A' | 'B' {
  const notAboveBlank = columns.notAboveBlank[i]
  if (notAboveBlank === 1) return 'B'
  if (notAboveBlank === 2) return 'A'
  return columns.detectedA[i]! > 0 ? 'A' : 'B'
}
