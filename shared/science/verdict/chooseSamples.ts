import { amountFactors, type AmountFactors, type AmountField } from '../normalisation/amountFactors'
import { CannotCompare } from '../normalisation/cannotCompare'
import type { ComparedSample } from './settings'

export const AMOUNT_FIELD_NAMES: Record<AmountField, string> = { amount: 'amount', volumeMl: 'volume', dilution: 'dilution', injectionUl: 'injection volume' }

export interface ChosenSamples {
  /** Positions of the samples that are compared. */
  compared: number[]
  /** Positions of the blanks that are judged against: process blanks where there are any, else solvent blanks. */
  blanks: number[]
  blankKind: 'processBlank' | 'solventBlank' | null
  /** Samples with a side that are not compared, and why. */
  leftOut: { index: number, why: string }[]
  /** Per sample: factor to normalised counts, and the absolute one; NaN where it is not compared, 1 where the amount step is off. */
  factor: Float64Array
  absoluteFactor: Float64Array
  amountUnit: 'mg' | 'mL' | null
  takenAsEqual: AmountField[]
}

/**
 * Decides which samples are compared and by what factor. Only samples with a side are; blanks, pooled QCs and standards never.
 * @throws CannotCompare where a side has nothing left to compare, or amounts in mg and mL are mixed
 */
export function chooseSamples(samples: readonly ComparedSample[], normaliseByAmount: boolean): ChosenSamples {
  const sided = samples.flatMap((sample, index) => sample.kind === 'sample' && sample.side ? [{ index, sample }] : [])
  requireBothSides(sided.map(({ sample }) => sample), '')
  const factors = normaliseByAmount ? amountFactors(sided.map(({ sample }) => sample)) : withoutAmount(sided.length)
  const factor = new Float64Array(samples.length).fill(Number.NaN)
  const absoluteFactor = factor.slice()
  const compared: number[] = []
  const leftOut: ChosenSamples['leftOut'] = []
  sided.forEach(({ index, sample }, i) => {
    const missing = factors.missing[i] ?? []
    if (missing.length > 0) {
      leftOut.push({ index, why: `${sample.name} has no ${missing.map(field => AMOUNT_FIELD_NAMES[field]).join(', no ')} and is not compared with samples that have.` })
      return
    }
    compared.push(index)
    factor[index] = factors.scaled[i]!
    absoluteFactor[index] = factors.absolute[i]!
  })
  requireBothSides(compared.flatMap(index => samples[index] ?? []), ` ${leftOut.map(({ why }) => why).join(' ')} Complete the sample sheet, or switch the amount step off.`)
  const blankKind = (['processBlank', 'solventBlank'] as const).find(kind => samples.some(sample => sample.kind === kind)) ?? null
  const blanks = samples.flatMap((sample, index) => sample.kind === blankKind ? [index] : [])
  return { compared, blanks, blankKind, leftOut, factor, absoluteFactor, amountUnit: factors.unit, takenAsEqual: factors.takenAsEqual }
}

function withoutAmount(count: number): AmountFactors {
  const ones = new Float64Array(count).fill(1)
  return { absolute: ones, scaled: ones, unit: null, takenAsEqual: [], missing: Array.from({ length: count }, () => []) }
}

function requireBothSides(samples: readonly ComparedSample[], what: string): void {
  for (const side of ['A', 'B'] as const) {
    if (!samples.some(sample => sample.side === side)) {
      throw new CannotCompare(`Side ${side} has no sample to compare.${what || ' Give at least one sample of the sheet this side.'}`)
    }
  }
}

