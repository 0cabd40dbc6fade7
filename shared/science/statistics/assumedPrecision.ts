import normalCdf from '@stdlib/stats-base-dists-normal-cdf'

/** Normal quantiles: 95 % two-sided, and 5 % one-sided as two one-sided tests use. */
export const TWO_SIDED_95 = 1.959963984540054
export const ONE_SIDED_95 = 1.6448536269514722

/**
 * Standard deviation of log2 that an assumed coefficient of variation (percent, > 0) stands for:
 * σ² = ln(1 + CV²) / ln²2, the log-normal relation.
 */
export function log2Sigma(cvPercent: number): number {
  return Math.sqrt(Math.log1p((cvPercent / 100) ** 2)) / Math.LN2
}

/** Standard error of a log2 ratio of nA against nB preparations at an assumed precision. */
export function assumedStandardError(cvPercent: number, nA: number, nB: number): number {
  return log2Sigma(cvPercent) * Math.sqrt(1 / nA + 1 / nB)
}

/** The smallest |log2 ratio| called more at an assumed precision: max(foldLimit, 1.96 s). */
export function assumedMoreLimit(foldLimit: number, standardError: number): number {
  return Math.max(foldLimit, TWO_SIDED_95 * standardError)
}

/** Is |log2 ratio| small enough to be level at an assumed precision: |log2 ratio| + 1.645 s < foldLimit. */
export function assumedLevel(log2Ratio: number, foldLimit: number, standardError: number): boolean {
  return Math.abs(log2Ratio) + ONE_SIDED_95 * standardError < foldLimit
}

/** Share of truly equal features that chance alone would call more: 2Φ(−max(foldLimit, 1.96 s) / s). */
export function chanceOfMore(foldLimit: number, standardError: number): number {
  return 2 * normalCdf(-assumedMoreLimit(foldLimit, standardError) / standardError, 0, 1)
}
