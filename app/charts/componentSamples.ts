import type { ComparedSample, ComparisonSettings } from '#shared/science/verdict/settings'
import { displayFactors, groupOf, type SampleGroup } from '~/charts/sampleValues'
import { FURTHER_GROUPS, type FurtherGroup } from '~/utils/componentsView'

/** A sample that takes part: its place in the comparison's data, its group, and the factor to normalised counts. */
export interface ComponentSample {
  index: number
  name: string
  group: SampleGroup
  /** As the comparison has it; 1, as injected, for what is not of a side. */
  factor: number
}

const ORDER: readonly SampleGroup[] = ['A', 'B', 'pooledQc', 'standard', 'blank', 'notCompared']

/** All samples in the order of their groups; one of a side that the comparison leaves out counts as not compared. */
export function componentSamples(samples: readonly ComparedSample[], settings: Pick<ComparisonSettings, 'normaliseByAmount'>): ComponentSample[] {
  const factor = displayFactors(samples, settings)
  const all = samples.map((sample, index): ComponentSample => {
    const own = factor[index] ?? Number.NaN
    const isCompared = own > 0
    return { index, name: sample.name, group: groupOf(sample, isCompared), factor: isCompared ? own : 1 }
  })
  return ORDER.flatMap(group => all.filter(sample => sample.group === group))
}

/** Samples that may take part: of the sides, and of the further groups that are chosen. */
export function samplesOfGroups(samples: readonly ComponentSample[], further: readonly FurtherGroup[]): ComponentSample[] {
  return samples.filter(({ group }) => !FURTHER_GROUPS.some(each => each === group && !further.includes(each)))
}

/** Those samples by group, only groups that there are. */
export function samplesByGroup<S extends { group: SampleGroup }>(samples: readonly S[]): { group: SampleGroup, samples: S[] }[] {
  return ORDER.flatMap((group) => {
    const own = samples.filter(sample => sample.group === group)
    return own.length > 0 ? [{ group, samples: own }] : []
  })
}
