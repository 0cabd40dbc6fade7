import type { Verdict } from './verdicts'

/** One value a feature. Numbers that do not apply are NaN; ratios are B over A, log2. */
export interface VerdictColumns {
  mz: Float64Array
  retentionMinutes: Float64Array
  /** Codes of VERDICTS, REASONS and METHODS. */
  verdict: Uint8Array
  reason: Uint8Array
  method: Uint8Array
  /** 0 neither, 1 side A, 2 side B: detected there but not above blank, so counted as not found. */
  notAboveBlank: Uint8Array
  /** Preparations, and injections, that detect the feature. */
  detectedA: Uint16Array
  detectedB: Uint16Array
  injectionsA: Uint16Array
  injectionsB: Uint16Array
  /** The aligned feature beside this one that holds the other side; -1 none. */
  neighbour: Int32Array
  /** Median normalised intensity over detecting preparations. */
  levelA: Float64Array
  levelB: Float64Array
  log2Ratio: Float64Array
  /** 95 % interval of log2Ratio. */
  low: Float64Array
  high: Float64Array
  p: Float64Array
  q: Float64Array
  equivalenceP: Float64Array
  /** How many times the present side stands above the other's highest floor. */
  reach: Float64Array
  /** "At least": lowest of the present side over everything on the other (a ratio, not log2). */
  atLeast: Float64Array
  /**
   * Of one-sided features: highest signal in the other side's traces over the level of the present side (NaN: not checked), and
   * how many of the other side's samples have a trace that covers the feature.
   */
  traceRatio: Float64Array
  traceSamples: Uint16Array
  /** Side over blanks, injected signal; NaN where no blank detects it. */
  blankRatioA: Float64Array
  blankRatioB: Float64Array
  /** Highest intensity over all tables, counts. */
  highestCounts: Float64Array
}

export interface VerdictResult {
  columns: VerdictColumns
  preparationsA: number
  preparationsB: number
  /** Samples compared, injections counted one by one. */
  samplesA: number
  samplesB: number
  counts: Record<Verdict, number>
  /** Features with a p-value: the number that the false discovery rate counts. */
  testedFeatures: number
  /** Features judged by assumed precision. */
  assumedFeatures: number
  /** Of those, how many equal ones chance alone would call more. */
  chanceMore: number
  /** One preparation a side and a precision at which 1.645·s ≥ foldLimit. */
  nothingCanBeLevel: boolean
  cautions: string[]
}

/** The columns that decideVerdicts fills; the others stand in the summary. */
export type DecidedColumns = ReturnType<typeof emptyColumns>

/** Columns of `features` rows with nothing decided. */
export function emptyColumns(features: number) {
  const numbers = () => new Float64Array(features).fill(Number.NaN)
  return {
    verdict: new Uint8Array(features),
    reason: new Uint8Array(features),
    method: new Uint8Array(features),
    notAboveBlank: new Uint8Array(features),
    neighbour: new Int32Array(features).fill(-1),
    log2Ratio: numbers(), low: numbers(), high: numbers(), p: numbers(), q: numbers(), equivalenceP: numbers(),
    reach: numbers(), atLeast: numbers(), traceRatio: numbers(), traceSamples: new Uint16Array(features), blankRatioA: numbers(), blankRatioB: numbers(),
  }
}
