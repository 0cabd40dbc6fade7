import { REASON } from './reasons'
import { VERDICT } from './verdicts'

export interface RatioOutcome {
  verdict: number
  reason: number
}

const more = (log2Ratio: number) => log2Ratio < 0 ? VERDICT.moreA : VERDICT.moreB

/** Fourth rule of verdicts with replicates: a tested ratio, its q, and p of equivalence within ± foldLimit (NaN: not equivalent). */
export function testedRatio(log2Ratio: number, q: number, equivalenceP: number, foldLimit: number, alpha: number): RatioOutcome {
  const certain = q <= alpha
  if (Math.abs(log2Ratio) >= foldLimit) {
    return certain ? { verdict: more(log2Ratio), reason: REASON.moreTested } : { verdict: VERDICT.unsettled, reason: REASON.notCertain }
  }
  if (equivalenceP <= alpha) return { verdict: VERDICT.level, reason: certain ? REASON.levelSmallDifference : REASON.levelTested }
  return { verdict: VERDICT.unsettled, reason: certain ? REASON.smallButCertain : REASON.smallNotLevel }
}

/** Fourth rule without replicates: `moreLimit` = max(foldLimit, 1.96 s), `level` = |log2 ratio| + 1.645 s < foldLimit. */
export function assumedRatio(log2Ratio: number, moreLimit: number, level: boolean): RatioOutcome {
  if (Math.abs(log2Ratio) >= moreLimit) return { verdict: more(log2Ratio), reason: REASON.moreAssumed }
  if (level) return { verdict: VERDICT.level, reason: REASON.levelAssumed }
  return { verdict: VERDICT.unsettled, reason: REASON.assumedBetween }
}
