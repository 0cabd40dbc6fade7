import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { reasonSentence } from '../../shared/science/verdict/reasonSentence'
import { REASONS } from '../../shared/science/verdict/reasons'
import { comparisonDefaults, type ComparedSample, type ComparisonSettings } from '../../shared/science/verdict/settings'
import type { SideInput } from '../../shared/science/verdict/sideSummary'
import { summariseSides } from '../../shared/science/verdict/summariseSides'
import { VERDICTS } from '../../shared/science/verdict/verdicts'

/** Not detected, as tests write it in rows of intensities. */
export const none = Number.NaN

/** One sample as a test writes it: its name, what differs from a plain weighed sample, and its intensities. */
export interface Written extends Partial<ComparedSample> {
  name: string
  values: readonly number[]
  /** Highest signals in its trace; absent: it has none. */
  trace?: readonly number[]
}

const plain: Omit<ComparedSample, 'id' | 'name'> = {
  kind: 'sample', side: null, preparation: '', amount: 100, amountUnit: 'mg', volumeMl: 1, dilution: 1, injectionUl: 2,
  runOrder: null, batch: null, floor: 100, floorSource: 'stated', gapFilled: false, measure: 'area',
}

export const onA = (name: string, values: readonly number[], rest: Partial<Written> = {}): Written => ({ name, values, side: 'A', ...rest })
export const onB = (name: string, values: readonly number[], rest: Partial<Written> = {}): Written => ({ name, values, side: 'B', ...rest })
export const blank = (name: string, values: readonly number[], rest: Partial<Written> = {}): Written => ({ name, values, kind: 'solventBlank', amount: null, ...rest })

/** Input of a comparison: features at m/z 200, 201 … and minutes 1, 2 …; `neighbours` lists pairs that lie within tolerance. */
export function comparisonInput(written: readonly Written[], options: { neighbours?: [number, number][], normaliseByAmount?: boolean } = {}): SideInput {
  const features = written[0]?.values.length ?? 0
  const beside = Array.from({ length: features }, (_, i) => (options.neighbours ?? []).flatMap(([one, other]) => one === i ? [other] : other === i ? [one] : []))
  const neighbourStart = new Int32Array(features + 1)
  beside.forEach((list, i) => { neighbourStart[i + 1] = (neighbourStart[i] ?? 0) + list.length })
  return {
    samples: written.map(({ values: _, trace: __, ...rest }) => ({ ...plain, id: rest.name, ...rest })),
    intensity: written.map(({ values }) => Float64Array.from(values)),
    traceMaxima: written.map(({ trace }) => trace ? Float64Array.from(trace) : null),
    mz: Float64Array.from({ length: features }, (_, i) => 200 + i),
    retentionMinutes: Float64Array.from({ length: features }, (_, i) => 1 + i),
    neighbourStart,
    neighbourList: Int32Array.from(beside.flat()),
    normaliseByAmount: options.normaliseByAmount ?? true,
  }
}

/** Both stages at once, with verdicts, reasons and sentences as words. */
export function judge(written: readonly Written[], settings: Partial<ComparisonSettings> = {}, neighbours: [number, number][] = []) {
  const all = { ...comparisonDefaults, ...settings }
  const summary = summariseSides(comparisonInput(written, { neighbours, normaliseByAmount: all.normaliseByAmount }))
  const result = decideVerdicts(summary, all)
  return {
    summary,
    result,
    verdicts: [...result.columns.verdict].map(code => VERDICTS[code]),
    reasons: [...result.columns.reason].map(code => REASONS[code]),
    sentences: [...result.columns.reason].map((_, i) => reasonSentence(i, result, all, { a: 'Millrace', b: 'Tallow Lane' })),
    cautions: result.cautions,
  }
}
