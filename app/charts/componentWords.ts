import type { ChosenFeatures, FeaturesPresent } from '#shared/science/components/chooseFeatures'
import type { SampleComponents } from '#shared/science/components/sampleComponents'
import type { ComponentScaling } from '#shared/science/components/scaleFeatures'
import { counted, wholeNumber } from '#shared/science/numeric/numberWords'
import { variancePercent } from '~/charts/componentAxis'
import type { ComponentSample } from '~/charts/componentSamples'
import { formatShare } from '~/utils/formatMeasures'

export const SCALING_WORDS: Readonly<Record<ComponentScaling, string>> = { none: 'none', unitVariance: 'unit variance', pareto: 'Pareto' }

const WEIGHT_WORDS: Readonly<Record<ComponentScaling, string>> = {
  none: 'Centred, not scaled: the greatest changes weigh most.',
  unitVariance: 'Centred and scaled to unit variance: every feature weighs alike.',
  pareto: 'Centred and Pareto scaled: great changes weigh more, but less than unscaled.',
}

export const PRESENT_WORDS: Readonly<Record<FeaturesPresent, string>> = { oneSide: 'present in at least one side', bothSides: 'present in both sides' }

/** What the components rest on: features, values filled in, what is left out and what stands as injected. */
export function componentsBasis(found: SampleComponents, chosen: ChosenFeatures, samples: readonly ComponentSample[], present: FeaturesPresent, scaling: ComponentScaling, samplesLeftOut = 0): string {
  const values = found.features.length * samples.length
  const filled = found.filledValues === 0
    ? 'No value was missing.'
    : `${wholeNumber(found.filledValues)} of ${wholeNumber(values)} values (${formatShare(found.filledValues, values)}), in ${counted(found.filledFeatures, 'feature')}, were not detected and are filled with half the feature’s minimum.`
  const leftOut = [
    chosen.setAside > 0 ? `${wholeNumber(chosen.setAside)} set aside` : '',
    chosen.notPresent > 0 ? `${wholeNumber(chosen.notPresent)} not ${PRESENT_WORDS[present]}` : '',
    found.notFound > 0 ? `${wholeNumber(found.notFound)} found in none of these samples` : '',
    found.withoutSpread > 0 ? `${wholeNumber(found.withoutSpread)} that are the same in all of them` : '',
  ].filter(Boolean)
  const byHand = samplesLeftOut > 0 ? ` ${counted(samplesLeftOut, 'sample')} left out by hand.` : ''
  const asInjected = samples.some(({ group }) => group !== 'A' && group !== 'B') ? ' Samples of no side stand as injected.' : ''
  return `log2 of ${counted(found.features.length, 'feature')} ${PRESENT_WORDS[present]}, in ${counted(samples.length, 'sample')}.${byHand} ${WEIGHT_WORDS[scaling]} ${filled}${leftOut.length > 0 ? ` Left out: ${leftOut.join(', ')}.` : ''}${asInjected}`
}

/** The shares of the first components and of the rest: "PC1 43.2 %, PC2 21.0 %, 3 more 35.8 %". */
export function explainedVariance({ share, rank }: Pick<SampleComponents, 'share' | 'rank'>, most: number): string {
  const shown = Array.from(share.subarray(0, most), (each, k) => `PC${k + 1} ${variancePercent(each)}`)
  const rest = share.subarray(most).reduce((sum, each) => sum + each, 0)
  return rank > most ? `${shown.join(', ')}, ${rank - most} more ${variancePercent(rest)}` : shown.join(', ')
}

/** Why there is no plot, or only a line of points; empty where there is a plane. */
export function rankSentence(rank: number, samples: number): string {
  if (samples < 2) return 'Principal components need at least two samples. Let more samples take part.'
  if (rank === 0) return 'These samples do not differ in any feature that takes part, so there are no components. Let more samples or features take part.'
  if (rank === 1) return samples === 2 ? 'Two samples differ along one component only; with a third there is a plane.' : 'These samples differ along one component only.'
  return ''
}
