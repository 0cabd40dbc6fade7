import { AMOUNT_FIELD_NAMES } from './chooseSamples'
import { sidesFollowBatch, sidesFollowRunOrder } from './confounding'
import { isUnprovable } from './floors'
import { counted, threeDigits, times } from '../numeric/numberWords'
import type { ComparedSample, ComparisonSettings } from './settings'
import type { SideSummary } from './sideSummary'
import { traceCautions } from './traceCautions'
import type { VerdictResult } from './verdictResult'

/** Factors further apart than this may leave the range in which the detector answers in proportion. */
const FACTOR_SPREAD_LIMIT = 3

type Decided = Omit<VerdictResult, 'cautions'>

/** What a reader must know before trusting the verdicts, as sentences; shown on the page, printed in exports, stored with the version. */
export function cautionsOf(summary: SideSummary, settings: ComparisonSettings, decided: Decided): string[] {
  const compared = summary.samples.filter((_, index) => !Number.isNaN(summary.factor[index]!))
  return [
    ...precisionCautions(settings, decided),
    ...summary.leftOut.map(({ why }) => why),
    ...amountCautions(summary),
    ...measureCautions(compared),
    ...blankCautions(summary),
    ...floorCautions(compared),
    ...traceCautions(summary),
    ...designCautions(compared),
  ]
}

function precisionCautions(settings: ComparisonSettings, decided: Decided): string[] {
  const { preparationsA, preparationsB, assumedFeatures, chanceMore, nothingCanBeLevel } = decided
  const cautions: string[] = []
  if (preparationsA < 2 || preparationsB < 2) {
    cautions.push(`Assumed precision: with ${counted(preparationsA, 'preparation')} of side A against ${preparationsB} of side B there is no p-value. Ratios are judged as if every value scattered by ${threeDigits(settings.assumedCvPercent)} %.`)
    cautions.push(`Of ${counted(assumedFeatures, 'feature')} judged so, chance alone would call about ${chanceMore < 0.5 ? 'none' : Math.round(chanceMore)} more if all were equal.`)
  }
  else if (assumedFeatures > 0) {
    cautions.push(`Assumed precision: ${counted(assumedFeatures, 'feature')} found in one preparation of a side only; ${assumedFeatures === 1 ? 'it is' : 'they are'} judged as if every value scattered by ${threeDigits(settings.assumedCvPercent)} %.`)
  }
  if (nothingCanBeLevel) cautions.push(`At an assumed precision of ${threeDigits(settings.assumedCvPercent)} % nothing can be called level within ${times(2 ** settings.foldLimit)}.`)
  return cautions
}

function amountCautions(summary: SideSummary): string[] {
  if (!summary.normaliseByAmount) return ['The amount step is off: intensities are compared as injected, whatever was weighed and diluted.']
  const cautions: string[] = []
  if (summary.takenAsEqual.length > 0) {
    cautions.push(`No compared sample states its ${summary.takenAsEqual.map(field => AMOUNT_FIELD_NAMES[field]).join(', its ')}: taken as equal in all.`)
  }
  let lowest = Number.POSITIVE_INFINITY
  let highest = 0
  for (const factor of summary.factor) {
    if (factor < lowest) lowest = factor
    if (factor > highest) highest = factor
  }
  if (highest / lowest > FACTOR_SPREAD_LIMIT) {
    cautions.push(`The amount factors of the samples differ by ${times(highest / lowest)}, more than ${times(FACTOR_SPREAD_LIMIT)}: the detector may not answer in proportion over that range.`)
  }
  return cautions
}

function measureCautions(compared: readonly ComparedSample[]): string[] {
  const names = { area: 'peak areas', height: 'peak heights', unknown: 'not known to be area or height' } as const
  const measures = (['area', 'height', 'unknown'] as const).filter(measure => compared.some(sample => sample.measure === measure))
  if (measures.length < 2) return []
  return [`Intensities are mixed: ${measures.map(measure => `${names[measure]} in ${compared.filter(sample => sample.measure === measure).map(sample => sample.name).sort().join(', ')}`).join('; ')}. Ratios between them can mislead.`]
}

function blankCautions(summary: SideSummary): string[] {
  if (!summary.blankKind) return ['No blanks: features that come from solvents, vials or work-up are not recognised.']
  return summary.blankPerUl ? [] : ['Injection volumes are not known for all samples and blanks: the blank check takes them as equal.']
}

function floorCautions(compared: readonly ComparedSample[]): string[] {
  const cautions: string[] = []
  const estimated = compared.filter(sample => sample.floorSource === 'estimated')
  if (estimated.length > 0) {
    cautions.push(`The floor of ${estimated.length} of ${counted(compared.length, 'table')} is estimated from its lowest intensities, not stated. Local noise can hide a feature above it.`)
  }
  const gapFilled = compared.filter(isUnprovable).map(sample => sample.name).sort()
  if (gapFilled.length > 0) {
    cautions.push(`${gapFilled.join(', ')}: under 1 % empty cells, so the table seems gap-filled. State its peak limit; until then nothing can be found only on one side.`)
  }
  return cautions
}

function designCautions(compared: readonly ComparedSample[]): string[] {
  const cautions: string[] = []
  if (sidesFollowRunOrder(compared)) cautions.push('All injections of one side ran before all of the other: a drift of the instrument would look like a difference of the sides.')
  if (sidesFollowBatch(compared)) cautions.push('No batch holds samples of both sides: a difference between batches would look like a difference of the sides.')
  return cautions
}
