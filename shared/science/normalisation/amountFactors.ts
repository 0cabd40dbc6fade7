import { CannotCompare } from './cannotCompare'

/** What the amount step needs of a sample. */
export interface AmountSample {
  name: string
  amount: number | null
  amountUnit: 'mg' | 'mL' | null
  volumeMl: number | null
  dilution: number | null
  injectionUl: number | null
}

export const AMOUNT_FIELDS = ['amount', 'volumeMl', 'dilution', 'injectionUl'] as const
export type AmountField = (typeof AMOUNT_FIELDS)[number]

export interface AmountFactors {
  /** volumeMl × dilution / amount / injectionUl of each sample; NaN where something is missing. */
  absolute: Float64Array
  /** The same divided by its median, so that normalised values keep the size of counts. */
  scaled: Float64Array
  /** Unit of the amounts; null where no sample has one. */
  unit: 'mg' | 'mL' | null
  /** Fields that no sample has: taken as equal in all. */
  takenAsEqual: AmountField[]
  /** Fields that each sample lacks though others have them: such a sample can't stand beside the others. */
  missing: AmountField[][]
}

/**
 * Factors that turn counts into counts per unit of sample: volume (mL) × dilution / amount / injection (µL).
 * A field that no sample has is taken as equal in all and reported; a field that some have makes the factor of the others NaN.
 * @throws CannotCompare where amounts in mg and in mL are mixed
 */
export function amountFactors(samples: readonly AmountSample[]): AmountFactors {
  const given = (sample: AmountSample, field: AmountField) => sample[field] !== null && sample[field] > 0
  const takenAsEqual = AMOUNT_FIELDS.filter(field => !samples.some(sample => given(sample, field)))
  const needed = AMOUNT_FIELDS.filter(field => !takenAsEqual.includes(field))
  const missing = samples.map(sample => needed.filter(field => !given(sample, field)))
  const unit = commonUnit(samples.filter(sample => given(sample, 'amount')))
  const of = (sample: AmountSample, field: AmountField) => needed.includes(field) ? sample[field] ?? Number.NaN : 1
  const absolute = Float64Array.from(samples, (sample, i) => missing[i]?.length
    ? Number.NaN
    : of(sample, 'volumeMl') * of(sample, 'dilution') / of(sample, 'amount') / of(sample, 'injectionUl'))
  const middle = median(absolute)
  return { absolute, scaled: absolute.map(factor => factor / middle), unit, takenAsEqual, missing }
}

function commonUnit(weighed: readonly AmountSample[]): 'mg' | 'mL' | null {
  const inMl = weighed.filter(sample => sample.amountUnit === 'mL')
  if (inMl.length > 0 && inMl.length < weighed.length) {
    const names = inMl.map(sample => sample.name).join(', ')
    throw new CannotCompare(`Amounts in mg and in mL are mixed (in mL: ${names}); they can't be weighed against each other. Give all amounts in one unit, or switch the amount step off.`)
  }
  return weighed.length === 0 ? null : inMl.length > 0 ? 'mL' : 'mg'
}

function median(factors: Float64Array): number {
  const sorted = factors.filter(factor => !Number.isNaN(factor)).sort()
  const half = sorted.length >> 1
  if (sorted.length === 0) return 1
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2
}
