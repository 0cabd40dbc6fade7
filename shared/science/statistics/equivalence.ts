import { studentUpperTail } from './studentTail'

/** The two one-sided p-values and the larger of them, which decides. */
export interface EquivalenceResult {
  /** against "the difference is −margin or less" */
  pLow: number
  /** against "the difference is +margin or more" */
  pHigh: number
  p: number
}

/**
 * Equivalence of two means by two one-sided tests (Schuirmann 1987, J Pharmacokinet Biopharm 15:657):
 * equivalent within ± `margin` where p ≤ alpha. Standard error and df are those of the test of the difference.
 */
export function equivalence(difference: number, standardError: number, degreesOfFreedom: number, margin: number): EquivalenceResult {
  const pLow = studentUpperTail((difference + margin) / standardError, degreesOfFreedom)
  const pHigh = studentUpperTail((margin - difference) / standardError, degreesOfFreedom)
  return { pLow, pHigh, p: Math.max(pLow, pHigh) }
}

/** The larger p alone, for hot loops: it always belongs to the bound the difference lies nearer to. */
export function equivalenceP(difference: number, standardError: number, degreesOfFreedom: number, margin: number): number {
  return studentUpperTail((margin - Math.abs(difference)) / standardError, degreesOfFreedom)
}
