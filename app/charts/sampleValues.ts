import type { ComparisonData } from '#shared/formats/comparisonData'
import { chooseSamples } from '#shared/science/verdict/chooseSamples'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import type { ComparedSample, ComparisonSettings } from '#shared/science/verdict/settings'

/** Which row of the drawing a sample stands in. */
export type SampleGroup = 'A' | 'B' | 'blank' | 'pooledQc' | 'standard' | 'notCompared'

export interface SampleValue {
  name: string
  preparation: string
  group: SampleGroup
  /** Intensity as the table states it; NaN: not detected. */
  counts: number
  /** From counts to the normalised value; 1 for what is not compared. */
  factor: number
  /** Normalised as the comparison does; blanks, pooled QCs and standards as injected. */
  value: number
  /** The lowest the sample could have shown, normalised likewise; NaN where it is not known. */
  floor: number
  floorSource: 'stated' | 'estimated'
  runOrder: number | null
  batch: string | null
}

const ORDER: readonly SampleGroup[] = ['A', 'B', 'blank', 'pooledQc', 'standard', 'notCompared']

/** What the groups are called in drawings and in words. */
export const groupLabels = (names: SideNames): Record<SampleGroup, string> => ({
  A: names.a, B: names.b, blank: 'blanks', pooledQc: 'pooled QCs', standard: 'standards', notCompared: 'not compared',
})

/** The group a sample is drawn in; a sample of a side that is not compared stands apart. */
export function groupOf({ kind, side }: Pick<ComparedSample, 'kind' | 'side'>, isCompared: boolean): SampleGroup {
  if (kind === 'sample') return isCompared && side ? side : 'notCompared'
  return kind === 'pooledQc' || kind === 'standard' ? kind : 'blank'
}

/** Factor of each sample to normalised counts, as the comparison has it; NaN for what is not compared. */
export function displayFactors(samples: readonly ComparedSample[], settings: Pick<ComparisonSettings, 'normaliseByAmount'>): Float64Array {
  return chooseSamples(samples, settings.normaliseByAmount).factor
}

/** One feature in every sample: side A, side B, then blanks, pooled QCs and standards. */
export function sampleValues(data: Pick<ComparisonData, 'samples' | 'intensity'>, factors: Float64Array, settings: Pick<ComparisonSettings, 'intensityLimit'>, feature: number): SampleValue[] {
  const values = data.samples.map((sample, s): SampleValue => {
    const counts = data.intensity[s]?.[feature] ?? Number.NaN
    const isCompared = (factors[s] ?? 0) > 0
    const factor = isCompared ? factors[s] ?? 1 : 1
    const floor = Number.isNaN(sample.floor) ? settings.intensityLimit ?? Number.NaN : Math.max(sample.floor, settings.intensityLimit ?? 0)
    return {
      name: sample.name, preparation: sample.preparation || sample.name, group: groupOf(sample, isCompared), counts, factor, value: counts * factor, floor: floor * factor,
      floorSource: sample.floorSource, runOrder: sample.runOrder, batch: sample.batch,
    }
  })
  return values.map((value, place) => ({ value, place }))
    .sort((one, other) => ORDER.indexOf(one.value.group) - ORDER.indexOf(other.value.group) || one.place - other.place)
    .map(({ value }) => value)
}

/** The same values and floors as injected: in each table's own counts. */
export function asInjected(values: readonly SampleValue[]): SampleValue[] {
  return values.map(value => ({ ...value, value: value.counts, floor: value.floor / value.factor }))
}

/** Was the feature found in the sample? */
export const isFound = ({ value }: Pick<SampleValue, 'value'>) => value > 0 && Number.isFinite(value)
